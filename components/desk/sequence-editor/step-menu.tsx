'use client';

import { DropdownMenu } from 'radix-ui';

export interface StepActs {
  rename(): void;
  addAfter(): void;
  duplicate(): void;
  moveUp(): void;
  moveDown(): void;
  remove(): void;
}

const entries: readonly { act: keyof StepActs; words: string; keys: string }[] = [
  { act: 'rename', words: 'Name it', keys: 'F2' },
  { act: 'addAfter', words: 'Add a step after it', keys: 'Alt N' },
  { act: 'duplicate', words: 'Duplicate', keys: 'Alt C' },
  { act: 'moveUp', words: 'Move up', keys: 'Alt ↑' },
  { act: 'moveDown', words: 'Move down', keys: 'Alt ↓' },
  { act: 'remove', words: 'Remove', keys: 'Alt Delete' },
];

/** What can be done with a step as a whole. */
export function StepMenu({ label, acts }: { label: string; acts: StepActs }) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger
        aria-label={label}
        className="inline-flex min-h-[30px] min-w-[30px] items-center justify-center text-accent hover:bg-accent-wash data-[state=open]:bg-accent data-[state=open]:text-on-accent max-sm:min-h-[46px] max-sm:min-w-[46px]"
      >
        <svg width="18" height="4" viewBox="0 0 18 4" aria-hidden="true" fill="currentColor">
          <path d="M0 0h4v4H0zM7 0h4v4H7zM14 0h4v4h-4z" />
        </svg>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content
        align="end"
        // The entry moves the focus itself, such as into the name.
        onCloseAutoFocus={(event) => {
          if (document.activeElement instanceof HTMLInputElement) event.preventDefault();
        }}
        className="z-30 min-w-[230px] border-2 border-b-8 border-ink bg-sheet py-1"
      >
        {entries.map(({ act, words, keys }) => (
          <DropdownMenu.Item
            key={act}
            onSelect={acts[act]}
            className="flex min-h-9 cursor-pointer items-center justify-between gap-6 px-3 outline-none data-highlighted:bg-accent data-highlighted:text-on-accent max-sm:min-h-[46px]"
          >
            <span>{words}</span>
            <span className="font-num text-cap">{keys}</span>
          </DropdownMenu.Item>
        ))}
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
