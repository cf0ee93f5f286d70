import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Beep } from '@/components/bench/beep/flood-machine';
import { createFloodStore } from '@/components/bench/beep/flood-store';

/** A clock that runs only when told. */
function handClock() {
  let now = 0;
  let timers: { at: number; run: () => void }[] = [];
  return {
    now: () => now,
    after: (ms: number, run: () => void) => {
      const timer = { at: now + ms, run };
      timers.push(timer);
      return () => {
        timers = timers.filter((other) => other !== timer);
      };
    },
    advance(ms: number) {
      const end = now + ms;
      for (;;) {
        const due = timers.filter(({ at }) => at <= end).sort((a, b) => a.at - b.at)[0];
        if (!due) break;
        timers = timers.filter((timer) => timer !== due);
        now = due.at;
        due.run();
      }
      now = end;
    },
  };
}

describe('the flood of a beep', () => {
  it('shows at once when the beep is heard', () => {
    const store = createFloodStore(handClock());
    store.hear(1);
    expect(store.showing()).toBe(1);
  });

  it('stays 1.5 s though the reading is done sooner', () => {
    const clock = handClock();
    const store = createFloodStore(clock);
    store.hear(1);
    clock.advance(300);
    store.hear(null);
    clock.advance(1200);
    expect(store.showing()).toBe(1);
    clock.advance(110);
    expect(store.showing()).toBeNull();
  });

  it('stays until the reading is done though that takes longer', () => {
    const clock = handClock();
    const store = createFloodStore(clock);
    store.hear(2);
    clock.advance(4000);
    expect(store.showing()).toBe(2);
    store.hear(null);
    expect(store.showing()).toBeNull();
  });

  it('leaves out a beep that comes and goes within a second of the last flood', () => {
    const clock = handClock();
    const store = createFloodStore(clock);
    store.hear(1);
    clock.advance(2000);
    store.hear(null);
    clock.advance(200);
    store.hear(2);
    expect(store.showing()).toBeNull();
    clock.advance(300);
    store.hear(null);
    clock.advance(2000);
    expect(store.showing()).toBeNull();
  });

  it('shows a beep that lasts once a second has passed', () => {
    const clock = handClock();
    const store = createFloodStore(clock);
    store.hear(1);
    clock.advance(2000);
    store.hear(null);
    clock.advance(200);
    store.hear(2);
    clock.advance(910);
    expect(store.showing()).toBe(2);
  });

  it('never flashes: floods of at least 1.5 s, at least 1 s apart, whatever a chattering board does', () => {
    const change = fc.record({
      ms: fc.integer({ min: 0, max: 1200 }),
      heard: fc.constantFrom<Beep | null>(null, 1, 2),
    });
    fc.assert(
      fc.property(fc.array(change, { maxLength: 60 }), (changes) => {
        const clock = handClock();
        const store = createFloodStore(clock);
        const edges: { at: number; showing: Beep | null }[] = [];
        store.subscribe(() => edges.push({ at: clock.now(), showing: store.showing() }));
        for (const { ms, heard } of changes) {
          clock.advance(ms);
          store.hear(heard);
        }
        for (let i = 1; i < edges.length; i++) {
          const lasted = edges[i]!.at - edges[i - 1]!.at;
          const least = edges[i - 1]!.showing === null ? 1000 : 1500;
          expect(lasted).toBeGreaterThanOrEqual(least);
        }
      }),
    );
  });
});
