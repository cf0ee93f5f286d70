import { compareSequences } from '../sequence/compare-sequences';
import type { Sequence } from '../sequence/step';
import { stepWord } from '../sequence/value-words';
import type { SingleChange } from './single-changes';

const mostValues = 2;

/** A change in a few words; the comparison of the revisions has every field. */
export function changeWords({ kind, stepIds, sequence }: SingleChange, released: Sequence): string {
  const { steps, rule } = compareSequences(released, sequence);
  const step = steps.find(({ stepId }) => stepId === stepIds[0]);
  switch (kind) {
    case 'rule':
      return `Decision rule ${rule?.from} → ${rule?.to}`;
    case 'order':
      return 'Another order of steps';
    case 'added':
      return `${stepWord(step!.after!)} is new`;
    case 'removed':
      return `${stepWord(step!.before!)} is removed`;
    case 'changed': {
      if (!step) return 'Changed';
      const values = step.values.map(({ label, from, to }) => `${label} ${from} → ${to}`);
      const said = [...(step.switched ? [`Switched ${step.switched}`] : []), ...values];
      return said.length > mostValues ? `${said.slice(0, mostValues).join(', ')} and more` : said.join(', ');
    }
  }
}
