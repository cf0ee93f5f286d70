/** States kept in the database. Each list feeds one PostgreSQL enum: adding a value needs a migration. */

export const boardTypeRevisionStates = ['draft', 'submitted', 'approved', 'superseded', 'withdrawn'] as const;
export type BoardTypeRevisionState = (typeof boardTypeRevisionStates)[number];

export const sequenceRevisionStates = ['draft', 'submitted', 'released', 'superseded', 'withdrawn'] as const;
export type SequenceRevisionState = (typeof sequenceRevisionStates)[number];

export const lotStates = ['open', 'paused', 'closed'] as const;
export type LotState = (typeof lotStates)[number];

export const runKinds = ['production', 'engineering', 'daily-check', 'commissioning'] as const;
export type RunKind = (typeof runKinds)[number];

/** Who closed a run: the station in the ordinary way, recovery after a crash, or the journal kept while the database was away. */
export const runClosers = ['station', 'recovery', 'journal'] as const;
export type RunCloser = (typeof runClosers)[number];

export const supplyOffWitnesses = ['meter', 'supply'] as const;

export const dispositionKinds = ['rework', 'scrap', 'concession', 'return'] as const;
export type DispositionKind = (typeof dispositionKinds)[number];

export const labelStates = ['waiting', 'printed', 'failed'] as const;
export type LabelState = (typeof labelStates)[number];

export const instrumentKinds = ['supply', 'multimeter', 'fixture-controller'] as const;
export type InstrumentKind = (typeof instrumentKinds)[number];

export const stationSchemes = ['day', 'night', 'system'] as const;
export type StationScheme = (typeof stationSchemes)[number];

export const dryRunStates = ['waiting', 'running', 'done', 'cancelled', 'failed'] as const;
export type DryRunState = (typeof dryRunStates)[number];

/** What a stored file is for; each kind has its own allowed types and sizes. */
export const fileKinds = ['trimmer-photo', 'fixture-drawing', 'instruction-picture'] as const;
export type FileKind = (typeof fileKinds)[number];

export const reasonCodeUses = ['rework', 'scrap', 'concession', 'return', 'hold', 'hold-release'] as const;
export type ReasonCodeUse = (typeof reasonCodeUses)[number];

/** What held a lot. */
export const holdCauses = ['person', 'run-rule', 'yield-floor', 'same-reason', 'failed-check'] as const;
export type HoldCauseKind = (typeof holdCauses)[number];

export const mailStates = ['waiting', 'trying', 'sent', 'stopped'] as const;
export type MailState = (typeof mailStates)[number];

export const mailTopics = [
  'hold-raised',
  'yield-floor',
  'expiry',
  'shift-report',
  'certificate',
  'approval-waits',
  'trial',
] as const;
export type MailTopic = (typeof mailTopics)[number];

export const deliveryStates = ['waiting', 'trying', 'delivered', 'stopped'] as const;
export type DeliveryState = (typeof deliveryStates)[number];
