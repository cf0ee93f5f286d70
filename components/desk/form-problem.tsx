import { VerdictMark } from '@/components/ui/verdict-mark';

/** What is wrong with a form as a whole; nothing while all is well. */
export function FormProblem({ problem }: { problem: string | null }) {
  if (!problem) return null;
  return (
    <p role="alert" className="flex items-start gap-2 font-bold text-reject">
      <VerdictMark shape="reject" size={15} />
      <span>{problem}</span>
    </p>
  );
}
