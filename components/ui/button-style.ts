/** Filled: the one next move. Outlined: others. Link: a way back. Stop: ends something at once. Unavailable: dashed. */
export type ButtonKind = 'filled' | 'outlined' | 'link' | 'stop' | 'unavailable';
export type ButtonSize = 'desk' | 'bench';

const sizes: Record<ButtonSize, string> = {
  desk: 'min-h-9 px-4 py-1.5 text-body max-sm:min-h-[46px]',
  bench: 'min-h-(--sw-bench-button) px-9 text-b-line',
};
const borders: Record<ButtonSize, string> = { desk: 'border-2', bench: 'border-4' };
const kinds: Record<ButtonKind, string> = {
  filled: 'border-accent bg-accent text-on-accent hover:border-accent-deep hover:bg-accent-deep',
  outlined: 'border-accent bg-sheet text-accent hover:bg-accent-wash active:bg-accent active:text-on-accent',
  link: 'border-transparent !px-1 text-accent underline decoration-2 underline-offset-4 hover:bg-accent-wash',
  stop: 'border-ink bg-ink text-paper hover:bg-ink-2 hover:border-ink-2',
  unavailable: 'cursor-not-allowed border-dashed border-ink-3 text-ink-3',
};

/** Classes of a button or of a link that looks like one. */
export const buttonClass = (kind: ButtonKind, size: ButtonSize = 'desk') =>
  `inline-flex items-center justify-center gap-3 text-center font-bold leading-tight ${sizes[size]} ${borders[size]} ${kinds[kind]}`;
