import type { BenchView, ReadinessItem, RunView, Say } from '../contracts/bench-view';
import { readScan } from './scan-code';
import { say } from './sayings';
import type { BenchState } from './types';

/** Everything a bench screen shows. `run` is the run going on or the last one, while its end is still shown. */
export function viewBench(state: BenchState, run: RunView | null, revision: number): BenchView {
  const { phase, operator, standing, trial } = state;
  return {
    revision,
    station: state.station,
    operator: operator && {
      accountId: operator.accountId,
      number: operator.number,
      locale: operator.locale,
      mayCommission: operator.mayCommission,
    },
    lot: trial ? null : state.lot,
    next: trial ? trial.next : state.next,
    run: phase.kind === 'run' || phase.kind === 'over' || phase.kind === 'bin' ? run : null,
    offer: takesOffers(state) ? standing.offer : null,
    engineering: trial && !isStationsOwn(phase) ? trial.offer : null,
    readiness: [...standing.readiness, ...linkItems(state)],
    call: standing.call,
    label: trial ? null : standing.label,
    refusal: state.refusal,
    screen: screenOf(state),
  };
}

/** Where the panel of an offer stands. */
function takesOffers({ operator, trial, phase }: BenchState): boolean {
  return operator !== null && trial === null && (phase.kind === 'idle' || phase.kind === 'choose-lot');
}

/** Daily check and commissioning are no engineering runs, whatever they interrupt. */
function isStationsOwn(phase: BenchState['phase']): boolean {
  return (
    phase.kind === 'daily-check' || phase.kind === 'commissioning' || (phase.kind === 'run' && phase.check !== null)
  );
}

function screenOf(state: BenchState): BenchView['screen'] {
  const { phase, standing } = state;
  switch (phase.kind) {
    case 'run':
    case 'over':
      return { kind: 'run' };
    case 'bin':
      return { kind: 'bin', binCode: readScan(phase.bin.binCode).short };
    case 'daily-check':
      return phase;
    case 'commissioning': {
      const { state: stage, what, done, of, values } = phase;
      return { kind: 'commissioning', state: stage, what, done, of, values };
    }
  }
  const waiting = whatIsWaitedFor(state);
  if (waiting) return { kind: 'starting', what: waiting };
  switch (phase.kind) {
    case 'badge':
      return { kind: 'badge' };
    case 'pin':
      return {
        kind: 'pin',
        operatorNumber: phase.number,
        badgeReadIso: phase.badgeReadIso,
        retryAtIso: phase.retryAtIso,
        problem: phase.problem,
      };
  }
  if (standing.reasons.length > 0)
    return { kind: 'may-not-test', reasons: standing.reasons, otherStation: standing.otherStation };
  if (phase.kind === 'choose-lot') return { kind: 'choose-lot', lots: phase.lots };
  if (!state.fixture.seenEmpty) return { kind: 'empty-fixture', nextSerial: phase.next?.serial ?? null };
  return { kind: 'idle', last: state.last };
}

function whatIsWaitedFor(state: BenchState): Say | null {
  const { ready } = state;
  if (ready.databaseAway) return say('database-away');
  if (!ready.opened) return say('opening-instruments');
  if (ready.linksDown.length > 0) return say('reopening-instruments');
  const [stranger] = ready.strangers;
  if (stranger) return say('wrong-instrument', { which: stranger });
  if (!ready.supplyOff) return say('switching-supply-off');
  return null;
}

const silent = { supply: 'supply-silent', meter: 'meter-silent', controller: 'controller-silent' } as const;

function linkItems(state: BenchState): ReadinessItem[] {
  const { ready } = state;
  const unlimited = { validFrom: null, validUntil: null };
  const [down] = ready.linksDown;
  const [stranger] = ready.strangers;
  const trouble = down ? say(silent[down]) : stranger ? say('wrong-instrument', { which: stranger }) : null;
  return [
    {
      key: 'links',
      label: '',
      state: ready.opened && !trouble ? 'good' : 'bad',
      sentence: trouble ?? (ready.opened ? say('links-answer') : say('opening-instruments')),
      ...unlimited,
    },
    {
      key: 'database',
      label: '',
      state: ready.databaseAway ? 'bad' : 'good',
      sentence: ready.databaseAway ? say('database-away') : say('database-answers'),
      ...unlimited,
    },
  ];
}
