import {
  type ChartQuantity,
  type LotReview,
  type QuotedIndex,
  type ReviewBaseline,
  type ReviewLimits,
} from '../contracts/lot-review';
import type { LotView } from '../contracts/lot-view';
import { capabilityStudy, type CapabilityResult } from '../statistics/capability/capability-study';
import { standardised } from '../statistics/charts/individuals';
import { runRules, runSignals, type RunRule, type RunSignal } from '../statistics/charts/run-rules';
import { standardDeviation } from '../statistics/summary/moments';
import { compareGroups } from './compare-groups';
import { comparisonFactors, labelReader, type ShiftClock } from './comparison-factors';
import { boardsOfBaseline, limitsOfFrozen, type FrozenFigures } from './frozen-baseline';
import { binWidth, histogramBins } from './histogram-bins';
import { lotYields } from './lot-yields';
import { quotedOfStudy, quotedOfValues } from './quoted-index';
import { markOf, measuredValues, type ReviewBoard } from './review-board';
import { countBroken, runStretches } from './run-stretches';

export interface ReviewQuestion {
  view: Pick<LotView, 'quantity' | 'rules' | 'interval' | 'compare'>;
  size: number;
  /** In test order. */
  boards: readonly ReviewBoard[];
  withoutVerdict: LotReview['withoutVerdict'];
  /** Oldest first. */
  components: readonly { component: string; batch: string; fromAt: Date }[];
  shifts: ShiftClock;
  limits: Partial<Record<ChartQuantity, ReviewLimits | null>>;
  baselines: Partial<Record<ChartQuantity, (FrozenFigures & BaselineStory) | null>>;
}

interface BaselineStory {
  frozenAt: Date;
  fromLots: string[];
  byName: string | null;
}

/** Tenths of a microvolt are nobody's business on a chart, and cost bytes. */
const rounded = (value: number | null) => (value === null ? null : Math.round(value * 1e6) / 1e6);

/** Everything that the page shows of a lot's figures for one quantity. */
export function reviewLot(question: ReviewQuestion): LotReview {
  const { view, boards, components, shifts } = question;
  const { quantity } = view;
  const limits = question.limits[quantity] ?? null;
  const own = ruledSeries(question, quantity);
  const factors = comparisonFactors(components);
  const factor = factors.some(({ value }) => value === view.compare) ? view.compare : factors[0]!.value;
  const values = boards.map((board) => board.values[quantity]);
  const compared = compareGroups(values, boards.map(labelReader(factor, components, shifts)));
  const stationCodes = [...new Set(boards.map((board) => board.stationCode))].sort();
  const width = binWidth(own.values, limits);
  const study = capabilityOf(own.values, limits);
  return {
    quantity,
    size: question.size,
    stationCodes,
    points: {
      serials: boards.map((board) => board.serial),
      values: values.map(rounded),
      found: boards.map((board) => rounded(board.found[quantity])),
      marks: boards.map(markOf).join(''),
      endedAt: boards.map((board) => Math.round(board.endedAt.getTime() / 1000)),
      station: boards.map((board) => stationCodes.indexOf(board.stationCode)),
      group: compared.group,
    },
    limits,
    baseline: baselineOf(question, own.values),
    stretches: runStretches(chosen(own.signals, view.rules), own.z, own.places),
    broken: countBroken(own.signals),
    yields: lotYields(boards, view.interval),
    quoted: {
      trip: quotedIndex(question, 'trip-volts', { series: own, study }),
      release: quotedIndex(question, 'release-volts', { series: own, study }),
    },
    capability: study,
    deviation: standardDeviation(own.values),
    bins: width === null ? [] : histogramBins(own.values, width),
    factors,
    comparison: { factor, groups: compared.groups, result: compared.result },
    withoutVerdict: question.withoutVerdict,
  };
}

const chosen = (signals: readonly RunSignal[], rules: readonly RunRule[]) =>
  signals.filter((signal) => rules.includes(signal.rule));

/** Values of a quantity with what the rules say of them; no rule speaks without a frozen baseline. */
function ruledSeries(
  { boards, baselines }: ReviewQuestion,
  quantity: ChartQuantity,
  rules: readonly RunRule[] = runRules,
) {
  const { values, places } = measuredValues(boards, quantity);
  const stored = baselines[quantity];
  const z = stored ? standardised(values, limitsOfFrozen(stored)) : [];
  return { values, places, z, signals: runSignals(z, rules) };
}

function capabilityOf(values: readonly number[], limits: ReviewLimits | null): CapabilityResult {
  return limits ? capabilityStudy(values, limits) : { kind: 'noLimits' };
}

/** Of the quantity shown from its study; of the other one without a study of its own. */
function quotedIndex(
  question: ReviewQuestion,
  quantity: ChartQuantity,
  shown: { series: ReturnType<typeof ruledSeries>; study: CapabilityResult },
): QuotedIndex | null {
  const isShown = quantity === question.view.quantity;
  const series = isShown ? shown.series : ruledSeries(question, quantity, question.view.rules);
  const quoted = isShown
    ? quotedOfStudy(shown.study)
    : quotedOfValues(series.values, question.limits[quantity] ?? null);
  return quoted && { ...quoted, stable: chosen(series.signals, question.view.rules).length === 0 };
}

function baselineOf({ baselines, view }: ReviewQuestion, values: readonly number[]): LotReview['baseline'] {
  const stored = baselines[view.quantity];
  if (!stored)
    return values.length < boardsOfBaseline
      ? { kind: 'waiting', values: values.length, needed: boardsOfBaseline }
      : { kind: 'no-spread' };
  const { individuals, movingRange } = limitsOfFrozen(stored);
  return {
    kind: 'frozen',
    centre: stored.centre,
    sigma: stored.sigma,
    lower: individuals.lower,
    upper: individuals.upper,
    meanRange: movingRange.centre,
    rangeUpper: movingRange.upper,
    boards: stored.boards,
    frozenIso: stored.frozenAt.toISOString(),
    fromLots: stored.fromLots,
    byName: stored.byName,
  } satisfies ReviewBaseline;
}
