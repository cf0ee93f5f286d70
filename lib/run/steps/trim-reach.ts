import type { Ending } from '../../decision/decide-verdict';
import type { TrimSettings } from '../../trim/types';
import type { Points } from '../facts';
import type { StepContext } from '../machine';
export function refuseUntrimmable(_settings: TrimSettings, _found: Points, _context: StepContext): Ending | null {
  return null;
}
