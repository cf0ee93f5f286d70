import { z } from 'zod';
import { baudRates, stationLinkSchema } from './station-link';
import { stationSchemes } from './stored-states';

const baudRate = z.coerce.number().pipe(z.union(baudRates.map((rate) => z.literal(rate))));

const codeSchema = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9]{1,8}$/, { error: 'Use up to 8 letters and digits, such as S4.' });

/** A station as its form shows it: the link in single fields, of which those of the other kind are left out. */
const stationFields = {
  /** Printed on the bin and part of the bench's address, so it stays as it was first given. */
  code: codeSchema,
  name: z.string().trim().min(2, { error: 'Write the name.' }).max(60),
  fixture: z.string().trim().min(2, { error: 'Write which fixture stands on it.' }).max(60),
  scheme: z.enum(stationSchemes),
  hasWiperProbe: z.boolean(),
  /** Empty: labels wait until a printer is chosen. */
  printerId: z.union([z.literal('').transform(() => null), z.uuid()]).nullable(),
  mainsHz: z.coerce.number().pipe(z.union([z.literal(50), z.literal(60)])),
  linkKind: z.enum(['simulated', 'serial']),
  baudRate,
  hasController: z.boolean(),
  /** Fixes the noise and offsets of a simulated station. */
  seed: z.coerce.number({ error: 'Write a whole number.' }).int().min(0).max(899_999),
  supplyPath: z.string().trim().max(200),
  meterPath: z.string().trim().max(200),
  /** Empty: no fixture controller. */
  controllerPath: z.string().trim().max(200),
};

type Fields = z.infer<z.ZodObject<typeof stationFields>>;

function linkOf(fields: Fields): unknown {
  const { linkKind: kind, baudRate, seed, hasController, supplyPath, meterPath, controllerPath } = fields;
  return kind === 'simulated'
    ? { kind, seed, baudRate, hasController }
    : { kind, supplyPath, meterPath, controllerPath: controllerPath || null, baudRate };
}

function withLink<F extends Fields>(fields: F, context: z.RefinementCtx) {
  const { code, name, fixture, scheme, hasWiperProbe, printerId, mainsHz } = fields;
  const link = stationLinkSchema.safeParse(linkOf(fields));
  if (!link.success) {
    for (const issue of link.error.issues)
      context.addIssue({ code: 'custom', message: issue.message, path: issue.path.map(String) });
    return z.NEVER;
  }
  const ports =
    link.data.kind === 'serial' ? [link.data.supplyPath, link.data.meterPath, link.data.controllerPath] : [];
  const given = ports.filter((path) => path !== null);
  if (new Set(given).size < given.length) {
    context.addIssue({ code: 'custom', message: 'Each instrument needs a port of its own.', path: ['meterPath'] });
    return z.NEVER;
  }
  return { code, name, fixture, scheme, hasWiperProbe, printerId, mainsHz, link: link.data };
}

export const stationSchema = z.object(stationFields).transform(withLink);
export type StationForm = z.input<typeof stationSchema>;
export type StationSettings = z.output<typeof stationSchema>;

export const stationCodeSchema = z.object({ code: codeSchema });
export const retireStationSchema = z.object({
  code: codeSchema,
  reason: z.string().trim().min(3, { error: 'Say why, in a few words.' }).max(300),
});
export type RetireStationForm = z.input<typeof retireStationSchema>;
