import { z } from 'zod';

const serial = z.string().trim().min(3).max(40);

/** What a bench screen may ask of its station. Parsed by the screen and again by the gateway. */
export const benchCommandSchema = z.discriminatedUnion('kind', [
  /** Whatever the scanner read: badge, lot, serial or bin, told apart by prefix. */
  z.object({ kind: z.literal('scan'), text: z.string().min(1).max(80) }),
  z.object({ kind: z.literal('pin'), digits: z.string().regex(/^\d{4,8}$/) }),
  z.object({ kind: z.literal('another-badge') }),
  z.object({ kind: z.literal('badge-by-hand'), number: z.string().min(1).max(12) }),
  z.object({ kind: z.literal('choose-lot'), lotId: z.uuid() }),
  z.object({ kind: z.literal('leave-lot') }),
  /** Takes the draft that is on offer: boards scanned from now on make engineering runs of it. */
  z.object({ kind: z.literal('start-trial'), offerId: z.uuid() }),
  /** Back to the lot; the offer stays. */
  z.object({ kind: z.literal('leave-trial') }),
  /** The trial is done: its offer ends too. */
  z.object({ kind: z.literal('end-trial') }),
  /** Typed twice, compared here and at the server. */
  z.object({ kind: z.literal('serial-by-hand'), serial, again: serial }),
  z.object({
    kind: z.literal('confirm'),
    what: z.enum(['lid-and-board', 'lid-open', 'sealed', 'lid-closed', 'instruction-done', 'fixture-empty']),
  }),
  z.object({ kind: z.literal('answer'), ok: z.boolean() }),
  z.object({ kind: z.literal('will-not-turn') }),
  /** After "turning changes nothing": the operator was on the wrong screw and found the right one. */
  z.object({ kind: z.literal('screw-found') }),
  z.object({ kind: z.literal('stop') }),
  z.object({ kind: z.literal('try-again') }),
  z.object({ kind: z.literal('call-engineer') }),
  z.object({ kind: z.literal('print-label-again') }),
  z.object({ kind: z.literal('end-shift') }),
  /** An engineer at the bench measures the station; the reference board is on the fixture. */
  z.object({ kind: z.literal('start-commissioning') }),
  /** Leaves the result of a daily check or of a commissioning. */
  z.object({ kind: z.literal('continue') }),
  z.object({ kind: z.literal('scheme'), scheme: z.enum(['day', 'night', 'system']) }),
  z.object({ kind: z.literal('locale'), locale: z.string().min(2).max(8) }),
  /** A batch of a component changed at the bench. */
  z.object({
    kind: z.literal('component-batch'),
    component: z.string().min(1).max(40),
    batch: z.string().min(1).max(40),
  }),
]);
export type BenchCommand = z.infer<typeof benchCommandSchema>;

export const defectKinds = [
  'none',
  'supply-short',
  'zener-open',
  'zener-reversed',
  'wrong-zener',
  'feedback-open',
  'wrong-feedback',
  'op-amp-missing',
  'output-shorted',
  'wiper-open',
  'trimmer-at-end',
  'noisy-wiper',
  'reservoir-missing',
  'lifted-contact',
] as const;
export type DefectKind = (typeof defectKinds)[number];

/** The simulated hands: exist only on simulated stations, for demo and training. */
export const handsCommandSchema = z.discriminatedUnion('kind', [
  /** The next untested board of the lot, or a serial given, from the box onto the fixture. */
  z.object({ kind: z.literal('place-board'), serial: serial.optional() }),
  z.object({ kind: z.literal('remove-board') }),
  z.object({ kind: z.literal('lid'), closed: z.boolean() }),
  /** Positive is clockwise. */
  z.object({ kind: z.literal('turn'), turns: z.number().min(-4).max(4) }),
  z.object({ kind: z.literal('turn-as-prompted') }),
  z.object({ kind: z.literal('bump-supply'), milliseconds: z.number().min(1).max(500) }),
  z.object({ kind: z.literal('cable'), which: z.enum(['supply', 'meter', 'controller']), plugged: z.boolean() }),
  z.object({ kind: z.literal('defect'), defect: z.enum(defectKinds) }),
]);
export type HandsCommand = z.infer<typeof handsCommandSchema>;

/** What the drawer shows of the simulated bench. */
export interface HandsView {
  boardSerial: string | null;
  lidClosed: boolean;
  /** Turns from the anticlockwise end. */
  screwTurns: number;
  travelTurns: number;
  defect: DefectKind;
  cables: { supply: boolean; meter: boolean; controller: boolean };
  /** Serial of the board that `place-board` would take next. */
  nextSerial: string | null;
}

/** Answer to a command. A refusal is expected, has a code and a sentence of the catalogue. */
export type CommandReply = { ok: true } | { ok: false; code: string; params?: Record<string, string | number> };

/** One screen of a station leads; further ones watch, and their commands are refused. */
export interface ScreenRole {
  leads: boolean;
}

/**
 * socket.io: namespace /bench, `auth: { station: code }` in the handshake, room by station. Server to client: 'role'
 * ScreenRole, 'view' BenchView, 'reading' BenchReading, 'hands' HandsView. Client to server: 'command' BenchCommand,
 * 'hands' HandsCommand, both acknowledged with CommandReply.
 */
export const benchNamespace = '/bench';
