import { describe, expect, it } from 'vitest';
import { advanceRun, beginRun } from '@/lib/run/run';
import { runSayings } from '@/lib/run/sayings';
import type { RunEvent } from '@/lib/run/types';
import { viewNextRun, viewRun } from '@/lib/run/view';
import { planFor, playBoard } from './play-board';

const plan = planFor('CB1210');
const played = playBoard(plan, { seed: 11 });

/** Every view of a played board, in order. */
function views(events: RunEvent[]) {
  let { state } = beginRun(plan, 1_000);
  return [
    viewRun(state),
    ...events.map((event) => {
      state = advanceRun(state, event).state;
      return viewRun(state);
    }),
  ];
}
const all = views(played.events);

describe('rails', () => {
  it('are scaled a volt beyond the limits, on half volts', () => {
    expect(viewNextRun(plan.boardType, plan.sequence).rails).toMatchObject({
      scaleMinVolts: 9.5,
      scaleMaxVolts: 13.5,
      tripLimits: { min: 10.7, max: 10.9 },
      releaseLimits: { min: 12.1, max: 12.5 },
      targetVolts: 10.8,
      flags: [],
    });
  });
  it('draw the guard band from the uncertainty expected, then from the one judged with', () => {
    const first = all[0]!.rails.guardVolts!;
    const last = all.at(-1)!.rails.guardVolts!;
    const judged = played.result.measurements.find((m) => m.quantity === 'trip-volts' && m.phase === 'verified')!;
    expect(first.tripMin).toBeGreaterThan(10.7005);
    expect(first.tripMin).toBeLessThan(10.705);
    expect(last.tripMin).toBeCloseTo(judged.guardedMin!, 9);
    expect(last.tripMax).toBeCloseTo(judged.guardedMax!, 9);
  });
  it('show found points solid, and hollow as before once the trim began', () => {
    const before = all.find((view) => view.rails.flags.length > 0 && view.screen.kind === 'trim')!;
    expect(before.rails.flags.map((flag) => [flag.side, flag.hollow, flag.note])).toEqual([
      ['trip', true, 'before'],
      ['release', true, 'before'],
    ]);
    expect(before.rails.hysteresisVolts).toBeNull();
    const after = all.at(-1)!.rails;
    expect(after.flags.filter((flag) => !flag.hollow).map((flag) => [flag.side, flag.note])).toEqual([
      ['trip', null],
      ['release', null],
    ]);
    expect(after.hysteresisVolts).toBeCloseTo(after.flags[3]!.volts - after.flags[2]!.volts, 9);
  });
  it('tell how far the supply travelled with the load on and off', () => {
    const { travelled } = all.at(-1)!.rails;
    expect(travelled.fallingOnToVolts).toBeGreaterThan(10.7);
    expect(travelled.risingOffToVolts).toBeLessThan(12.5);
    expect(travelled.risingOn).toBe(true);
  });
});

describe('the screens of a run', () => {
  it('say only sentences of the catalogue, with all their parameters', () => {
    const said = all.flatMap(({ screen }) => (screen.kind === 'measuring' ? [screen.what] : []));
    expect(said.length).toBeGreaterThan(100);
    for (const { code, params = {} } of said) {
      expect(runSayings).toHaveProperty([code]);
      expect(Object.keys(params)).toEqual([...runSayings[code as keyof typeof runSayings]]);
    }
  });
  it('never go back in the step line', () => {
    const places = all.map(({ stepGroups }) => {
      const current = stepGroups.findIndex((g) => g.state === 'current');
      return current < 0 ? stepGroups.length : current;
    });
    expect(places).toEqual([...places].sort((a, b) => a - b));
  });
  it('show the supply on from the asking until the read-back', () => {
    for (const [i, event] of played.events.entries()) {
      if (event.kind === 'supply-is-on') expect(all[i]!.supply.state).toBe('on');
      if (event.kind === 'supply-is-off') expect(all[i + 1]!.supply).toMatchObject({ state: 'off', volts: 0.1 });
    }
  });
});
