import { useTranslations } from 'next-intl';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { Say } from '@/lib/contracts/bench-view';
import { useNumbers } from './use-numbers';

const serialNames = new Set(['serial', 'held']);

/**
 * A sentence of the catalogue. Times become clock times or dates, serial numbers are spoken by their last five characters, as people
 * at the bench do. A code without a text shows itself, so that an engineer can still look it up.
 */
export function useSay(): (saying: Say) => string {
  const t = useTranslations('say');
  const { when } = useNumbers();
  return ({ code, params = {} }) => {
    const key = code as Parameters<typeof t>[0];
    if (!t.has(key)) return code;
    const shown: Record<string, string | number> = {};
    for (const [name, value] of Object.entries(params)) {
      if (name.endsWith('Iso')) shown[name] = when(String(value));
      else if (serialNames.has(name)) shown[name] = serialGroups(String(value)).at(-1) ?? value;
      else shown[name] = value;
    }
    return t(key, shown);
  };
}
