import { z } from 'zod';
import type { Draft } from '@/lib/sequence/draft';
import type { KeptDraft } from '@/lib/sequence/draft-editor';
import { sequenceSchema } from '@/lib/sequence/step';

/** Text that is not saved yet, kept in the browser by revision and tab until the server has it. */

const prefix = (revisionId: string) => `sillwright-draft:${revisionId}:`;
const texts = z.record(z.string(), z.string());
const stored = z.object({ sequence: sequenceSchema, warningReasons: texts });
const kept = z.object({
  base: stored,
  draft: stored.extend({ unread: texts, conflicts: z.array(z.custom<Draft['conflicts'][number]>()) }),
});

export function keepText(revisionId: string, tabId: string, text: KeptDraft | null): void {
  try {
    const key = prefix(revisionId) + tabId;
    if (text) localStorage.setItem(key, JSON.stringify(text));
    else localStorage.removeItem(key);
  } catch {
    // Storage is full or forbidden: the text is still on the page and is sent as always.
  }
}

/** What this or another tab kept and did not get saved. It is taken once: whoever takes it keeps it from then on. */
export function takeKeptTexts(revisionId: string): KeptDraft[] {
  try {
    const keys = Object.keys(localStorage).filter((key) => key.startsWith(prefix(revisionId)));
    return keys.flatMap((key) => {
      const text = kept.safeParse(JSON.parse(localStorage.getItem(key) ?? 'null'));
      localStorage.removeItem(key);
      return text.success ? [text.data] : [];
    });
  } catch {
    return [];
  }
}
