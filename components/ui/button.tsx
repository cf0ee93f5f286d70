import Link from 'next/link';
import { useId, type ComponentProps, type ReactNode } from 'react';
import { buttonClass, type ButtonKind, type ButtonSize } from './button-style';

interface ButtonProps extends Omit<ComponentProps<'button'>, 'disabled'> {
  kind?: Exclude<ButtonKind, 'unavailable'>;
  size?: ButtonSize;
  /** Why it cannot be pressed now. It turns dashed, stays reachable by keyboard, and the reason stands beside it. */
  unavailable?: string | null;
  /** Shown in its place while the action runs; a second press does nothing. */
  pending?: string | null;
}

/** A press. An unavailable one says why rather than vanish. */
export function Button({ kind = 'outlined', size = 'desk', unavailable, pending, ...rest }: ButtonProps) {
  const reasonId = useId();
  const stopped = Boolean(unavailable || pending);
  const { className = '', children, onClick, type = 'button', ...others } = rest;
  const button = (
    <button
      {...others}
      type={stopped ? 'button' : type}
      aria-disabled={stopped || undefined}
      aria-describedby={unavailable ? reasonId : others['aria-describedby']}
      className={`${buttonClass(unavailable ? 'unavailable' : kind, size)} ${className}`}
      onClick={stopped ? (event) => event.preventDefault() : onClick}
      data-filled={kind === 'filled' && !stopped ? '' : undefined}
    >
      {kind === 'stop' && <StopSquare />}
      {pending ?? children}
    </button>
  );
  if (!unavailable) return button;
  return (
    <span className="inline-flex flex-wrap items-center gap-3">
      {button}
      <span id={reasonId} className={size === 'desk' ? 'text-cap text-ink-2' : 'text-b-label text-ink-2'}>
        {unavailable}
      </span>
    </span>
  );
}

interface ButtonLinkProps extends ComponentProps<typeof Link> {
  kind?: 'filled' | 'outlined' | 'link';
  size?: ButtonSize;
  children: ReactNode;
}

/** A link that looks like a button, for moves that only go somewhere. */
export function ButtonLink({ kind = 'outlined', size = 'desk', className = '', ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={`${buttonClass(kind, size)} ${className}`} />;
}

function StopSquare() {
  return <span aria-hidden="true" className="inline-block size-[0.8em] flex-none bg-current" />;
}
