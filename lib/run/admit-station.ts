import { say, type BenchSaying } from '../bench/sayings';
import type { ReadinessItem, Say } from '../contracts/bench-view';
import { learnableOvershootRange, overshootIsLearnable } from '../search/overshoot-range';
import { missingEquipment } from '../sequence/check-sequence';
import type { Sequence } from '../sequence/step';

/** Times are ISO; `validUntilIso` is the first moment at which something no longer holds. */
export interface StationFacts {
  nowIso: string;
  /** `code` as on the sticker. `validUntilIso` null: no certificate on record. */
  meter: InstrumentFacts;
  supply: InstrumentFacts;
  /** The newest daily check; null when there is none. */
  dailyCheck: { atIso: string; validHours: number; passed: boolean } | null;
  commissioning: { atIso: string; validUntilIso: string; overshoot: number } | null;
  /** Of the operator for the lot's board type; null while no lot is chosen. */
  training: { boardTypeCode: string; validUntilIso: string | null } | null;
  /** Instruments that do not answer, as the station reports them; and one that answers as another instrument. */
  silent: ('supply' | 'meter' | 'controller')[];
  stranger: 'supply' | 'meter' | 'controller' | null;
  databaseAnswers: boolean;
  hasController: boolean;
  hasWiperProbe: boolean;
  /** Of the lot; null while none is chosen. */
  sequence: Sequence | null;
  /** Errors that the rules find in it for this station. */
  sequenceErrors: number;
}

export interface InstrumentFacts {
  code: string;
  calibratedIso: string | null;
  validUntilIso: string | null;
}

export interface StationAdmission {
  readiness: ReadinessItem[];
  /** Why it may not test; empty when it may. Each with the code to tell the engineer. */
  reasons: (Say & { faultCode: string })[];
}

type Verdict = { item: ReadinessItem; faultCode: string | null };

const hourMs = 3_600_000;
const dayMs = 24 * hourMs;
/** From here on a date that nears its end is shown as such. */
const soonMs = { calibration: 30 * dayMs, 'daily-check': hourMs, commissioning: 14 * dayMs, training: 14 * dayMs };

/** May this station test this lot by this operator now: everything that must hold, with its dates, and what does not. */
export function admitStation(facts: StationFacts): StationAdmission {
  const verdicts = [
    calibration('meter', facts.meter, facts.nowIso),
    calibration('supply', facts.supply, facts.nowIso),
    dailyCheck(facts),
    commissioning(facts),
    ...training(facts),
    ...equipment(facts),
    links(facts),
    database(facts),
  ];
  return {
    readiness: verdicts.map(({ item }) => item),
    reasons: verdicts.flatMap(({ item, faultCode }) =>
      item.state === 'bad' && faultCode ? [{ ...item.sentence, faultCode }] : [],
    ),
  };
}

function verdict(
  key: ReadinessItem['key'],
  state: ReadinessItem['state'],
  sentence: Say,
  faultCode: string | null,
  dates: { label?: string; validFrom?: string | null; validUntil?: string | null } = {},
): Verdict {
  const { label = '', validFrom = null, validUntil = null } = dates;
  return { item: { key, label, state, validFrom, validUntil, sentence }, faultCode };
}

/** Ended at the moment itself, not after it. */
function standing(untilIso: string, nowIso: string, soon: number): ReadinessItem['state'] {
  const left = Date.parse(untilIso) - Date.parse(nowIso);
  return left <= 0 ? 'bad' : left <= soon ? 'soon' : 'good';
}

function calibration(key: 'meter' | 'supply', instrument: InstrumentFacts, nowIso: string): Verdict {
  const { code: label, calibratedIso: validFrom, validUntilIso: validUntil } = instrument;
  const dates = { label, validFrom, validUntil };
  if (!validUntil) return verdict(key, 'bad', say('not-calibrated'), key === 'meter' ? 'C-303' : 'C-304', dates);
  const state = standing(validUntil, nowIso, soonMs.calibration);
  const sentences = {
    meter: { good: 'meter-calibrated', soon: 'meter-calibration-soon', bad: 'meter-calibration-ended' },
    supply: { good: 'supply-calibrated', soon: 'supply-calibration-soon', bad: 'supply-calibration-ended' },
  } as const satisfies Record<string, Record<ReadinessItem['state'], BenchSaying>>;
  return verdict(key, state, say(sentences[key][state]), key === 'meter' ? 'C-301' : 'C-302', dates);
}

/** Valid for hours, not for a calendar day: a shift over midnight keeps its check. */
function dailyCheck({ dailyCheck: check, nowIso }: StationFacts): Verdict {
  if (!check) return verdict('daily-check', 'bad', say('daily-check-missing'), 'C-312');
  const validUntil = new Date(Date.parse(check.atIso) + check.validHours * hourMs).toISOString();
  const dates = { validFrom: check.atIso, validUntil };
  if (!check.passed) return verdict('daily-check', 'bad', say('daily-check-failed'), 'C-313', dates);
  const state = standing(validUntil, nowIso, soonMs['daily-check']);
  const sentences = { good: 'daily-check-valid', soon: 'daily-check-soon', bad: 'daily-check-ended' } as const;
  return verdict('daily-check', state, say(sentences[state]), 'C-311', dates);
}

/** Without an overshoot that the search can learn, its results would be wrong, not slow: such a station may not search. */
function commissioning({ commissioning: measured, nowIso }: StationFacts): Verdict {
  if (!measured) return verdict('commissioned', 'bad', say('commissioning-missing'), 'C-322');
  const dates = { validFrom: measured.atIso, validUntil: measured.validUntilIso };
  if (!overshootIsLearnable(measured.overshoot)) {
    const percent = (share: number) => Number((share * 100).toFixed(1));
    const { min, max } = learnableOvershootRange;
    const params = { percent: percent(measured.overshoot), minPercent: percent(min), maxPercent: percent(max) };
    return verdict('commissioned', 'bad', say('overshoot-outside-search', params), 'C-323', dates);
  }
  const state = standing(measured.validUntilIso, nowIso, soonMs.commissioning);
  const sentences = { good: 'commissioned', soon: 'commissioning-soon', bad: 'commissioning-ended' } as const;
  return verdict('commissioned', state, say(sentences[state]), 'C-321', dates);
}

function training({ training: trained, nowIso }: StationFacts): Verdict[] {
  if (!trained) return [];
  const { boardTypeCode: boardType, validUntilIso: validUntil } = trained;
  if (!validUntil) return [verdict('training', 'bad', say('training-missing', { boardType }), 'T-332')];
  const state = standing(validUntil, nowIso, soonMs.training);
  const sentence =
    state === 'bad' ? say('training-ended', { boardType }) : say(state === 'soon' ? 'training-soon' : 'trained');
  return [verdict('training', state, sentence, 'T-331', { validUntil })];
}

function equipment({ sequence, sequenceErrors, hasController, hasWiperProbe }: StationFacts): Verdict[] {
  if (!sequence) return [];
  const lacks = missingEquipment(sequence, { hasController, hasWiperProbe }).map((missing) =>
    missing === 'fixture-controller'
      ? verdict('fixture', 'bad', say('needs-controller'), 'F-361')
      : verdict('fixture', 'bad', say('needs-wiper-probe'), 'F-362'),
  );
  return sequenceErrors > 0 ? [...lacks, verdict('fixture', 'bad', say('sequence-has-errors'), 'F-363')] : lacks;
}

function links({ silent, stranger }: StationFacts): Verdict {
  const [first] = silent;
  if (first === 'supply') return verdict('links', 'bad', say('supply-silent'), 'L-341');
  if (first === 'meter') return verdict('links', 'bad', say('meter-silent'), 'L-342');
  if (first === 'controller') return verdict('links', 'bad', say('controller-silent'), 'L-343');
  if (stranger) return verdict('links', 'bad', say('wrong-instrument', { which: stranger }), 'L-344');
  return verdict('links', 'good', say('links-answer'), null);
}

function database({ databaseAnswers }: StationFacts): Verdict {
  return databaseAnswers
    ? verdict('database', 'good', say('database-answers'), null)
    : verdict('database', 'bad', say('database-away'), 'D-351');
}
