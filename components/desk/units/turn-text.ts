import type { Adjustment } from '@/lib/run/types';

const eighths = ['', '⅛', '¼', '⅜', '½', '⅝', '¾', '⅞'];

/** "1¾ turns", "½ turn" or "27 degrees". */
export function turnText({ words, turns }: Pick<Adjustment, 'words' | 'turns'>): string {
  if (!words) return `${turns.toFixed(2)} turns`;
  if (words.unit === 'degrees') return `${words.degrees} degrees`;
  const number = `${words.whole || ''}${eighths[words.eighths]}` || '0';
  return `${number} ${words.whole > 1 || (words.whole === 1 && words.eighths > 0) ? 'turns' : 'turn'}`;
}

const untilText = { turned: '', 'first-beep': ' until the first beep', 'second-beep': ' slowly until the second beep' };

/** "Clockwise about 1¾ turns until the first beep, from 10.34 V". */
export function adjustmentText(adjustment: Adjustment): string {
  const direction = adjustment.direction === 'clockwise' ? 'Clockwise' : 'Anticlockwise';
  const about = adjustment.until === 'turned' ? '' : 'about ';
  const from = adjustment.fromVolts === null ? '' : `, from ${adjustment.fromVolts.toFixed(2)} V`;
  return `${direction} ${about}${turnText(adjustment)}${untilText[adjustment.until]}${from}`;
}
