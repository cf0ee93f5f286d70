/** A desk session began with e-mail and password; a bench session with badge and PIN on the enrolled browser of one station. */
export const sessionKinds = ['desk', 'bench'] as const;
export type SessionKind = (typeof sessionKinds)[number];

export const attemptOutcomes = ['succeeded', 'failed', 'not-evaluated'] as const;
export type AttemptOutcome = (typeof attemptOutcomes)[number];
