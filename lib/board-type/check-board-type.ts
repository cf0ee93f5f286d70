import type { BoardType } from '../contracts/board-type';
import { fitsOnLabel } from '../barcode/label-layout';
import { readSerialPattern } from './serial-pattern';

/** What is wrong with a board type beyond the shape of its values. An error stops the asking for approval; a warning does not. */
export interface BoardTypeFinding {
  problem: string;
  severity: 'error' | 'warning';
  /** Path of the field that the sentence stands under. */
  field: string;
  sentence: string;
}

const v = (value: number) => `${value.toFixed(2)} V`;
const ma = (value: number) => `${Number((value * 1_000).toPrecision(3))} mA`;

export function checkBoardType(boardType: BoardType): BoardTypeFinding[] {
  return [
    ...checkLimits(boardType),
    ...checkParts(boardType),
    ...checkSensing(boardType),
    ...checkSearch(boardType),
    ...checkSerials(boardType),
  ];
}

type Report = (
  bad: boolean,
  problem: string,
  field: string,
  sentence: string,
  severity?: BoardTypeFinding['severity'],
) => void;

function collect(rules: (report: Report) => void): BoardTypeFinding[] {
  const found: BoardTypeFinding[] = [];
  rules((bad, problem, field, sentence, severity = 'error') => {
    if (bad) found.push({ problem, severity, field, sentence });
  });
  return found;
}

function checkLimits({ limits, absoluteMaximumVolts: most }: BoardType): BoardTypeFinding[] {
  const { tripVolts: trip, releaseVolts: release, hysteresisVolts: hysteresis } = limits;
  return collect((report) => {
    report(
      release.min <= trip.max,
      'release-below-trip',
      'limits.releaseVolts.min',
      `The release point lies above the trip point: use more than ${v(trip.max)}.`,
    );
    report(trip.min <= 0, 'trip-not-positive', 'limits.tripVolts.min', 'A trip point lies above 0 V.');
    report(
      hysteresis.min <= 0,
      'hysteresis-not-positive',
      'limits.hysteresisVolts.min',
      'Without hysteresis the output chatters: use more than 0 V.',
    );
    report(
      hysteresis.max < release.min - trip.max,
      'hysteresis-too-small',
      'limits.hysteresisVolts.max',
      `Trip and release limits lie ${v(release.min - trip.max)} apart at least, so no hysteresis below that can pass.`,
    );
    report(
      hysteresis.min > release.max - trip.min,
      'hysteresis-too-large',
      'limits.hysteresisVolts.min',
      `Trip and release limits lie ${v(release.max - trip.min)} apart at most, so no hysteresis above that can pass.`,
    );
    report(
      most <= release.max,
      'maximum-below-release',
      'absoluteMaximumVolts',
      `A board may release at ${v(release.max)}. Its absolute maximum must lie above that.`,
    );
  });
}

function checkParts({ design, limits, trimmer }: BoardType): BoardTypeFinding[] {
  const { reference } = design;
  return collect((report) => {
    report(
      reference.nominalVolts >= limits.tripVolts.min,
      'reference-above-trip',
      'design.reference.nominalVolts',
      `The reference must lie below the trip point. Use less than ${v(limits.tripVolts.min)}.`,
    );
    report(
      reference.nominalVolts < limits.referenceVolts.min * 0.9 ||
        reference.nominalVolts > limits.referenceVolts.max * 1.1,
      'reference-outside-limits',
      'design.reference.nominalVolts',
      `The limits of the reference are ${v(limits.referenceVolts.min)} to ${v(limits.referenceVolts.max)}.`,
    );
    report(
      design.outputDropVolts > limits.outputHighDropVolts.max,
      'drop-outside-limit',
      'limits.outputHighDropVolts.max',
      `A typical board drops ${v(design.outputDropVolts)}, so it would be rejected.`,
    );
    report(
      design.outputLowVolts > limits.outputLowVolts.max,
      'low-outside-limit',
      'limits.outputLowVolts.max',
      `A typical board’s low output is ${v(design.outputLowVolts)}, so it would be rejected.`,
    );
    report(
      design.quiescentAmps > limits.quiescentAmps.max,
      'current-outside-limit',
      'limits.quiescentAmps.max',
      `A typical board takes ${ma(design.quiescentAmps)}, so it would be rejected.`,
    );
    report(
      trimmer.backlashTurns >= trimmer.turns / 4,
      'backlash-too-large',
      'trimmer.backlashTurns',
      'A backlash of a quarter of the travel cannot be trimmed against.',
    );
  });
}

/** The state must be told apart at every supply that a test uses. */
function checkSensing({ sensing, limits, design, search }: BoardType): BoardTypeFinding[] {
  const low = limits.outputLowVolts.max;
  const high = search.supplyMinVolts - limits.outputHighDropVolts.max;
  const idle = limits.quiescentAmps.max;
  const loaded = search.supplyMinVolts / design.loadOhms;
  return collect((report) => {
    if (sensing.kind === 'output-voltage')
      report(
        sensing.thresholdVolts <= low || sensing.thresholdVolts >= high,
        'threshold-outside',
        'sensing.thresholdVolts',
        low < high
          ? `The low output reaches ${v(low)}, the high one falls to ${v(high)}. Use a value between them.`
          : `At ${v(search.supplyMinVolts)} a high output cannot be told from a low one. Raise the lowest supply.`,
      );
    else
      report(
        sensing.thresholdAmps <= idle || sensing.thresholdAmps >= loaded,
        'threshold-outside',
        'sensing.thresholdAmps',
        `Without load a board takes up to ${ma(idle)}, the load at the lowest supply ${ma(loaded)}. Use a value between them.`,
      );
  });
}

function checkSearch({ search, limits, absoluteMaximumVolts }: BoardType): BoardTypeFinding[] {
  const ranges = [
    ['tripVolts', 'trip point'],
    ['hysteresisVolts', 'hysteresis'],
  ] as const;
  return collect((report) => {
    for (const [name, words] of ranges) {
      const { min, max } = search[name];
      const limit = limits[name];
      report(
        min > limit.min,
        'search-misses-limit',
        `search.${name}.min`,
        `The ${words} may be ${v(limit.min)}. Look from there or below.`,
      );
      report(
        max < limit.max,
        'search-misses-limit',
        `search.${name}.max`,
        `The ${words} may be ${v(limit.max)}. Look up to there or above.`,
      );
    }
    report(
      search.supplyMinVolts >= search.tripVolts.min,
      'supply-above-search',
      'search.supplyMinVolts',
      `The supply must get below the lowest trip point, ${v(search.tripVolts.min)}.`,
    );
    report(
      search.tripVolts.max > absoluteMaximumVolts,
      'search-above-maximum',
      'search.tripVolts.max',
      `The absolute maximum is ${v(absoluteMaximumVolts)}. Look below it.`,
    );
    const widest = (limits.tripVolts.max - limits.tripVolts.min) / 10;
    report(
      search.noiseVolts > widest,
      'noise-too-large',
      'search.noiseVolts',
      `With noise above ${Number((widest * 1_000).toPrecision(2))} mV the trip limits cannot be told from it.`,
      'warning',
    );
  });
}

function checkSerials({ serialPattern, code }: BoardType): BoardTypeFinding[] {
  const read = readSerialPattern(serialPattern);
  if (!read.ok)
    return [{ problem: 'pattern-unread', severity: 'error', field: 'serialPattern', sentence: read.sentence }];
  return collect((report) => {
    report(
      !fitsOnLabel(read.example),
      'serial-not-printable',
      'serialPattern',
      `${read.example} does not fit on a label of 40 × 20 mm. Use a shorter serial.`,
    );
    report(
      !read.example.includes(code),
      'code-not-in-serial',
      'serialPattern',
      `Serials do not hold ${code}, so a board of another type may be taken for one of these.`,
      'warning',
    );
  });
}
