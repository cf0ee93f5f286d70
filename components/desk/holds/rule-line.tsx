import type { ReactNode } from 'react';
import { VerdictMark } from '@/components/ui/verdict-mark';

interface RuleLineProps {
  children: ReactNode;
  errors: readonly (string | undefined)[];
}

/** One rule as a sentence; what is wrong with a gap stands under it. */
export function RuleLine({ children, errors }: RuleLineProps) {
  const error = errors.find(Boolean);
  return (
    <li className="border-b border-hair py-1.5">
      <div className="flex flex-wrap items-center gap-x-2 gap-y-1">{children}</div>
      {error ? (
        <p role="alert" className="mt-1 flex items-center gap-1.5 pl-8 text-cap font-bold text-reject">
          <VerdictMark shape="reject" size={13} />
          {error}
        </p>
      ) : null}
    </li>
  );
}
