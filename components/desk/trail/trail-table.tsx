import type { TrailRow } from '@/lib/contracts/trail-page';
import { actionWords } from '@/lib/trail/entry-words';
import { EmptyState } from '@/components/ui/empty-state';
import { Time } from '../time';

const mostChanges = 4;

function Changes({ changes }: Pick<TrailRow, 'changes'>) {
  const shown = changes.slice(0, mostChanges);
  return (
    <ul className="grid gap-0.5">
      {shown.map(({ name, from, to }) => (
        <li key={name} className="min-w-0 break-words">
          <span className="text-ink-3">{name} </span>
          <span className="font-num font-semibold">
            {from === null ? to : to === null ? `${from} → none` : `${from} → ${to}`}
          </span>
        </li>
      ))}
      {changes.length > mostChanges ? <li className="text-ink-3">and {changes.length - mostChanges} more</li> : null}
    </ul>
  );
}

/** The square of an entry on the line of its chain: filled where the head was kept, red where no seal is. */
function ChainMark({ row }: { row: TrailRow }) {
  const words = row.seal === null ? 'not sealed' : row.checkpoint ? 'head kept' : 'sealed';
  const look =
    row.seal === null ? 'border-reject bg-reject' : row.checkpoint ? 'border-pass bg-pass' : 'border-pass bg-paper';
  return (
    <td className="relative w-8 p-0">
      <span
        aria-hidden
        className={`absolute inset-y-0 left-[9px] border-l-2 ${row.seal === null ? 'border-dashed border-reject' : 'border-pass'}`}
      />
      <span aria-hidden className={`absolute left-[3px] top-3 size-3.5 border-2 ${look}`} />
      <span className="sr-only">{words}</span>
    </td>
  );
}

const head = 'py-2 pr-4 text-left text-cap font-normal text-ink-2';
const cell = 'border-t border-hair py-2 pr-4 align-top';

/** Entries of the trail, newest first, on the line of their chain. */
export function TrailTable({ rows }: { rows: TrailRow[] }) {
  if (rows.length === 0) return <EmptyState title="No entry fits.">Take a word out of the line above.</EmptyState>;
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label="Entries of the trail">
      <table className="w-full min-w-[860px] text-table">
        <thead>
          <tr>
            <th scope="col" className={head}>
              <span className="sr-only">Seal</span>
            </th>
            {['When', 'Who', 'What', 'Of', 'From, to', 'Reason', 'Chain', 'Seal'].map((title) => (
              <th key={title} scope="col" className={head}>
                {title}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className={row.checkpoint ? 'bg-pass-wash' : undefined}>
              <ChainMark row={row} />
              <td className={`${cell} font-num`}>
                <Time iso={row.atIso} format="second" />
              </td>
              <td className={`${cell} font-bold`}>{row.who ?? 'Sillwright'}</td>
              <td className={cell}>{actionWords(row.action)}</td>
              <td className={`${cell} font-num break-words`}>{row.thing}</td>
              <td className={cell}>
                <Changes changes={row.changes} />
              </td>
              <td className={cell}>{row.reason}</td>
              <td className={`${cell} whitespace-nowrap font-num text-ink-2`}>
                {row.chain} {row.place}
              </td>
              <td className={`${cell} font-num text-ink-2`}>{row.seal ? `…${row.seal}` : 'none'}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
