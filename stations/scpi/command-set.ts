import { z } from 'zod';
import commandSets from './command-sets.json';

const message = z.string().min(1).max(80);
/** `{}` stands for the value. */
const template = message.regex(/\{\}/);

const session = z.object({
  /** Sent after every opening of the link, such as a remote-control command. */
  opening: z.array(message),
  nextError: message,
  /** Whether a command and the error query may share one message. */
  compound: z.boolean(),
  /** What ends a line sent to it. */
  terminator: z.enum(['\n', '\r\n']).default('\n'),
  deadlineMs: z.number().positive().max(30_000),
  identify: message,
});
const instrument = session.extend({ reset: message, clear: message, complete: message });

export const supplyCommandSetSchema = instrument.extend({
  setVolts: template,
  setAmps: template,
  setOvervoltage: template,
  overvoltageTripped: message,
  clearOvervoltage: message,
  switchOn: message,
  switchOff: message,
  measureVolts: message,
  measureAmps: message,
});
export type SupplyCommandSet = z.infer<typeof supplyCommandSetSchema>;

export const meterCommandSetSchema = instrument.extend({
  configure: message,
  setIntegrationCycles: template,
  closeChannel: template,
  read: message,
  /** Waited by us after a relay has moved. */
  relaySettleMs: z.number().nonnegative().max(1000),
});
export type MeterCommandSet = z.infer<typeof meterCommandSetSchema>;

export const controllerCommandSetSchema = session.extend({
  lidClosed: message,
  boardPresent: message,
  setPulseSeconds: template,
  trigger: message,
  achievedSeconds: message,
});
export type ControllerCommandSet = z.infer<typeof controllerCommandSetSchema>;

const commandSetsSchema = z.object({
  supply: z.record(z.string(), supplyCommandSetSchema),
  meter: z.record(z.string(), meterCommandSetSchema),
  controller: z.record(z.string(), controllerCommandSetSchema),
});

/** Every known command set by instrument and name: `command-sets.json`. Another make is another entry there. */
export const knownCommandSets = commandSetsSchema.parse(commandSets);
export const defaultCommandSet = 'scpi-1999';

export function fill(words: string, value: string | number): string {
  return words.replace('{}', String(value));
}
