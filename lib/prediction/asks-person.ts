import type { RunView } from '../contracts/bench-view';

/** Whether a run goes on only once a person has done something; what passes meanwhile is the person's time. */
export function asksPerson(screen: RunView['screen']): boolean {
  switch (screen.kind) {
    case 'seat':
      return screen.wants !== 'nothing';
    case 'seal':
      return screen.wants !== 'supply-off';
    case 'trim':
      return screen.trim.direction !== null;
    case 'operator-check':
    case 'instruction':
      return true;
    default:
      return false;
  }
}
