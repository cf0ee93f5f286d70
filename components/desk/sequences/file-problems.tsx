import { Table, Td, Th } from '@/components/ui/table';
import type { FileProblem } from '@/lib/sequence/sequence-file';
import { FormProblem } from '../form-problem';

const mostShown = 20;

/** What is wrong in a file: line, field, reason. */
export function FileProblems({ problems }: { problems: readonly FileProblem[] }) {
  const more = problems.length - mostShown;
  const what = problems.length === 1 ? 'One thing keeps' : `${problems.length} things keep`;
  return (
    <>
      <FormProblem problem={`${what} the file from being read. Nothing was stored.`} />
      <Table aria-label="Problems of the file">
        <thead>
          <tr>
            <Th number>Line</Th>
            <Th>Field</Th>
            <Th>Reason</Th>
          </tr>
        </thead>
        <tbody>
          {problems.slice(0, mostShown).map(({ line, field, reason }, i) => (
            <tr key={i}>
              <Td number label="Line">
                {line}
              </Td>
              <Td label="Field" className="font-num break-all">
                {field || 'the file'}
              </Td>
              <Td label="Reason">{reason}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {more > 0 ? <p className="text-cap text-ink-2">And {more} more.</p> : null}
    </>
  );
}
