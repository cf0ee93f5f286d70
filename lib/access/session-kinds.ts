/** A desk session began with e-mail and password; a bench session with badge and PIN on the enrolled browser of one station. */
export const sessionKinds = ['desk', 'bench'] as const;
export type SessionKind = (typeof sessionKinds)[number];

/** `cleared`: failed, and no longer counted since an administrator set a new password or PIN. */
export const attemptOutcomes = ['succeeded', 'failed', 'not-evaluated', 'cleared'] as const;
export type AttemptOutcome = (typeof attemptOutcomes)[number];
