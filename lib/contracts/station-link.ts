import { z } from 'zod';

export const baudRates = [9_600, 19_200, 38_400, 57_600, 115_200] as const;
const baudRate = z.union(baudRates.map((rate) => z.literal(rate)));
const path = z
  .string()
  .trim()
  .regex(/^\/\S+$/, { error: 'Give the full path of the serial port, such as /dev/serial/by-id/…' });

/** How a station reaches its instruments. Nothing else differs between a simulated station and a real one. */
export const stationLinkSchema = z.discriminatedUnion('kind', [
  /** Mock serial ports, simulated instruments and boards. `seed` fixes the station's own offsets and noise. */
  z.object({
    kind: z.literal('simulated'),
    seed: z.number().int().nonnegative(),
    baudRate,
    hasController: z.boolean(),
  }),
  /** Three serial paths; `controllerPath` is null on a station without a fixture controller. */
  z.object({
    kind: z.literal('serial'),
    supplyPath: path,
    meterPath: path,
    controllerPath: path.nullable(),
    baudRate,
  }),
]);
export type StationLink = z.infer<typeof stationLinkSchema>;

export function linkHasController(link: StationLink): boolean {
  return link.kind === 'simulated' ? link.hasController : link.controllerPath !== null;
}
