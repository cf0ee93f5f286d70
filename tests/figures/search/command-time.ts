import { beginSearch, nextSearchCommand, observeSearch } from '../../../lib/search/search';
import { PurePlant } from '../pure-plant';
import { seededRandom } from '../random';
import { percentile } from '../statistics';
import { populations } from './population';
import { targetRows } from './rows';
import { settingsOf } from './settings';

const timedBoards = 20;

/** Median time on this machine from an observation to the next command, in milliseconds, with and without a prior. */
export function medianCommandMs(): number {
  const spent: number[] = [];
  for (const row of [targetRows.fine, targetRows.prior]) {
    const settings = settingsOf(row);
    for (let i = 0; i < timedBoards; i++) {
      const random = seededRandom(i);
      const plant = new PurePlant(
        populations[row.population](random),
        { startVolts: settings.supplyMinVolts, noiseVolts: 1e-3, overshoot: { falling: 0.05, rising: 0.05 } },
        random,
      );
      let state = beginSearch(settings, { volts: plant.volts, output: plant.output });
      for (;;) {
        const from = performance.now();
        const command = nextSearchCommand(state);
        if (command.kind === 'finished') break;
        const chosen = performance.now() - from;
        const seen = plant.apply(command.volts, command.dwell);
        const observing = performance.now();
        state = observeSearch(state, seen);
        spent.push(chosen + performance.now() - observing);
      }
    }
  }
  return percentile(spent, 0.5);
}
