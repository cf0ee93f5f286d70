import type { RunFacts, Points } from '../run/facts';
import type { BoardType } from '../contracts/board-type';
import type { StationKind } from '../sequence/station-kind';
import { firstOf } from '../sequence/enabled-steps';
import type { Step } from '../sequence/step';
import { readsTheSame, watchedSequence, type LookedUp } from './looked-up';
import type { PlayedStep, StepEntry } from './play-step';

const mostRemembered = 600;
/** Plays of one step that differ only in what it read in others. */
const mostAlike = 4;

interface Remembered {
  played: PlayedStep;
  lookedUp: readonly LookedUp[];
}

/**
 * Steps played before, by all that can change them: the step, what it looks up in others, and what it finds on the bench.
 * One for each open draft; it forgets everything for another board type or station.
 */
export class StepMemo {
  private of = '';
  private readonly played = new Map<string, Remembered[]>();
  private readonly texts = new WeakMap<object, string>();

  /** To be called before a prediction. */
  begin(boardType: BoardType, station: StationKind): void {
    const of = this.textOf(boardType) + this.textOf(station);
    if (of === this.of) return;
    this.of = of;
    this.played.clear();
  }

  play(step: Step, entry: StepEntry, play: (entry: StepEntry) => PlayedStep): PlayedStep {
    const key = this.keyOf(step, entry);
    const alike = this.played.get(key) ?? [];
    const known = alike.find(({ lookedUp }) => readsTheSame(entry.plan.sequence, lookedUp));
    const remembered = known ?? playWatched(entry, play);
    // Oldest use first, so that the first to go is the one not asked for longest.
    this.played.delete(key);
    this.played.set(key, [remembered, ...alike.filter((each) => each !== known)].slice(0, mostAlike));
    if (this.played.size > mostRemembered) this.played.delete(this.played.keys().next().value!);
    return remembered.played;
  }

  private keyOf(step: Step, { plan, facts, bench }: StepEntry): string {
    return [
      this.textOfStep(step),
      ...lookedInto.map((kind) => firstOf(plan.sequence, kind)?.id ?? ''),
      this.textOf(plan.sequence.decisionRule),
      JSON.stringify(bench),
      factsText(step, facts),
    ].join('|');
  }

  /** What a step is called changes nothing. */
  private textOfStep(step: Step): string {
    return this.textOf(step, { ...step, name: '' });
  }

  /** Drafts keep what they do not change, so a text is made once. */
  private textOf(part: object, written = part): string {
    const known = this.texts.get(part);
    if (known !== undefined) return known;
    const text = JSON.stringify(written);
    this.texts.set(part, text);
    return text;
  }
}

/** Steps find their windows, the working supply and the contact check in these, or do without. */
const lookedInto = ['seat', 'power-up', 'find-points'] as const;

function playWatched(entry: StepEntry, play: (entry: StepEntry) => PlayedStep): Remembered {
  const { sequence, lookedUp } = watchedSequence(entry.plan.sequence);
  return { played: play({ ...entry, plan: { ...entry.plan, sequence } }), lookedUp };
}

function factsText(
  { kind }: Step,
  { supply, output, reference, found, trimmed, verified, measurements, ...facts }: RunFacts,
): string {
  const points = (each: Points | null | undefined) =>
    each &&
    [each.trip, each.release].flatMap(({ volts, standardUncertaintyVolts }) => [volts, standardUncertaintyVolts]);
  const newest = new Map(measurements.map((m) => [`${m.quantity}:${m.phase}`, [m.value.toFixed(2), m.passed]]));
  return JSON.stringify([
    facts.lidClosed,
    facts.boardPresent,
    facts.trimBegan,
    facts.trimFailing,
    facts.branchesTaken,
    supply.state,
    output,
    reference,
    // Only a trim starts from these once there are newer ones.
    kind === 'trim' || !trimmed ? points(found) : null,
    points(trimmed),
    points(verified.at(-1)),
    [...newest],
  ]);
}
