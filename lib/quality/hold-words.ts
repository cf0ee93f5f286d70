import type { HoldDetail } from '../contracts/lot-hold';
import { ruleWords } from './run-words';

const at = (stationCode: string | null) => (stationCode === null ? '' : ` at station ${stationCode}`);

/** The sentence that bench and desk show of a hold by rule. `reasonWords` says a reject's reason as people do. */
export function holdWords(detail: HoldDetail, reasonWords: (reason: string) => string): string {
  switch (detail.cause) {
    case 'run-rule': {
      const { holdRule, fromBoard, toBoard, stationCode } = detail;
      const again = holdRule.times > 1 ? `, ${holdRule.times} times within ${holdRule.within} boards` : '';
      return `Trip points leave their usual spread: ${lower(ruleWords[holdRule.rule])}${again}, boards ${fromBoard} to ${toBoard}${at(stationCode)}.`;
    }
    case 'same-reason':
      return `${detail.times} boards in a row were rejected for the same reason: ${lower(reasonWords(detail.reason))}${at(detail.stationCode)}.`;
    case 'yield-floor':
      return `Only ${detail.passed} of the last ${detail.boards} boards passed first time, less than ${(detail.least * 100).toFixed(0)} %.`;
    case 'failed-check':
      return `The daily check of station ${detail.stationCode} failed after ${detail.suspectBoards} boards of this lot were passed there.`;
  }
}

const lower = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);
