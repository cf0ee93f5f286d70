import type { DryRunView } from '@/lib/contracts/dry-run';
import type { Sequence } from '@/lib/sequence/step';
import { count } from '../numbers';

interface CostsProps {
  view: DryRunView;
  /** As the dry run ran it: gives the numbers of the steps. */
  sequence: Sequence;
}

const signed = (boards: number) =>
  boards === 0
    ? '0 boards'
    : `${boards > 0 ? '+' : '−'}${count(Math.abs(boards))} ${Math.abs(boards) === 1 ? 'board' : 'boards'}`;
const tone = (boards: number) => (boards < 0 ? 'text-reject' : boards > 0 ? 'text-pass' : '');

/** What each change costs or gains alone, and what is left when they act together. */
export function CostsAndGains({ view, sequence }: CostsProps) {
  const { result } = view;
  if (!result?.pair) return null;
  const { pair, changesAlone } = result;
  if (changesAlone.length === 0) return null;
  const total = pair.onlyDraft - pair.onlyReleased;
  const together = total - changesAlone.reduce((sum, { boards }) => sum + boards, 0);
  const rows = [
    ...changesAlone.map(({ words, stepIds, boards }) => ({ words, boards, steps: numbersOf(sequence, stepIds) })),
    ...(together === 0 ? [] : [{ words: 'Together they act otherwise than alone', boards: together, steps: '' }]),
  ];
  return (
    <div>
      <table className="w-full text-table">
        <caption className="sr-only">
          What each change costs or gains, in boards of {count(view.settings.boards)}
        </caption>
        <thead className="sr-only">
          <tr>
            <th scope="col">Step</th>
            <th scope="col">Change</th>
            <th scope="col">Boards</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={`${row.steps}${row.words}`} className="align-baseline">
              <td className="w-10 py-0.5 pr-2">{row.steps}</td>
              <td className="py-0.5 pr-3">{row.words}</td>
              <td className={`whitespace-nowrap py-0.5 text-right font-num font-bold ${tone(row.boards)}`}>
                {signed(row.boards)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-1 text-cap text-ink-2">
        Each change was also run alone. Together: <b className="font-num">{signed(total)}</b>.
      </p>
    </div>
  );
}

const numbersOf = ({ steps }: Sequence, stepIds: string[]) =>
  stepIds
    .map((id) => steps.findIndex((step) => step.id === id) + 1)
    .filter((place) => place > 0)
    .join(', ');
