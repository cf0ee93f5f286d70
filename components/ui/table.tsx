import type { ComponentProps, ReactNode } from 'react';

interface TableProps extends ComponentProps<'table'> {
  caption?: ReactNode;
  /** Rows stack on a phone; give each cell a `label`. */
  stacks?: boolean;
}

/** Hairlines only. Wide tables scroll sideways within themselves. */
export function Table({ caption, stacks = true, children, className = '', ...rest }: TableProps) {
  return (
    <div className="overflow-x-auto">
      <table {...rest} className={`sw-table ${stacks ? 'stacks' : ''} ${className}`}>
        {caption ? <caption>{caption}</caption> : null}
        {children}
      </table>
    </div>
  );
}

/** Column head. */
export function Th({ number = false, ...rest }: ComponentProps<'th'> & { number?: boolean }) {
  return <th scope="col" {...rest} className={number ? 'num' : undefined} />;
}

/** Cell; `number` sets it in Mono at the right, `label` names the column where rows stack. */
export function Td({ number = false, label, ...rest }: ComponentProps<'td'> & { number?: boolean; label?: string }) {
  return <td {...rest} data-label={label} className={number ? 'num' : rest.className} />;
}
