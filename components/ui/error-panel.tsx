import type { ReactNode } from 'react';
import { VerdictMark } from './verdict-mark';

/** What failed, then what to do. `action` is a link or button, such as "Try again". */
export function ErrorPanel({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div role="alert" className="border-y border-dashed border-rule py-3.5">
      <p>
        <VerdictMark shape="reject" size={14} /> <b>{title}</b> {children} {action}
      </p>
    </div>
  );
}
