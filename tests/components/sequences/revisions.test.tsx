// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, expect, it, vi } from 'vitest';
import { ComparisonTable } from '@/components/desk/sequences/comparison-table';
import { FileProblems } from '@/components/desk/sequences/file-problems';
import { ReleaseButtons } from '@/components/desk/sequences/release-buttons';
import { ReleaseDialog } from '@/components/desk/sequences/release-dialog';
import { ToastProvider } from '@/components/ui/toast';
import { cb2420 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { refusal } from '@/lib/contracts/outcome';
import type { RevisionHead } from '@/lib/contracts/sequence-draft';
import type { ComparisonPage } from '@/lib/contracts/sequence-pages';
import { compareSequences } from '@/lib/sequence/compare-sequences';
import type { Sequence, Step } from '@/lib/sequence/step';

vi.mock('next/navigation', () => ({ useRouter: () => ({ refresh() {} }) }));
afterEach(cleanup);

const head = (number: number, over: Partial<RevisionHead> = {}) =>
  ({
    id: `0c7d2f5e-6f0a-4a57-9d55-2b8c5b7f1a0${number}`,
    number,
    status: 'submitted',
    version: 5,
    note: 'Closer.',
    madeBy: 'K. Osei',
    madeAtIso: '2026-12-01T10:00:00Z',
    savedAtIso: '2026-12-01T10:00:00Z',
    submittedBy: 'K. Osei',
    releasedAtIso: null,
    warningReasons: {},
    ...over,
  }) as RevisionHead;

const release = vi.fn();
function openDialog() {
  release.mockReset();
  release.mockResolvedValue(refusal('wrong-password', 'Not the password. Enter it again.', 'password'));
  const onDone = vi.fn();
  render(
    <ReleaseDialog head={head(2)} inUse={1} signer="A. Boyle" onClose={() => {}} onDone={onDone} release={release} />,
  );
  return { onDone, password: screen.getByLabelText('Password of A. Boyle') };
}
const sign = () => fireEvent.click(screen.getByRole('button', { name: 'Sign and release r2' }));

it('the release dialog begins on the safe choice, and Enter does not sign', async () => {
  const { password } = openDialog();
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Not yet' }));
  fireEvent.click(screen.getByLabelText(/^I compared/));
  fireEvent.change(password, { target: { value: 'gauge jaws' } });
  expect(fireEvent.keyDown(password, { key: 'Enter' })).toBe(false);
  fireEvent.submit(password.closest('form')!);
  await new Promise((resolve) => setTimeout(resolve, 20));
  expect(release).not.toHaveBeenCalled();
});

it('asks what the signature means, then signs what was seen', async () => {
  const { password, onDone } = openDialog();
  release.mockResolvedValue({ ok: true, value: null });
  fireEvent.change(password, { target: { value: 'gauge jaws' } });
  sign();
  expect(await screen.findByText('Choose what your signature means.')).toBeTruthy();
  fireEvent.click(screen.getByLabelText(/tried on a station/));
  sign();
  await waitFor(() => expect(onDone).toHaveBeenCalled());
  expect(release).toHaveBeenCalledWith({
    revisionId: head(2).id,
    version: 5,
    meaning: 'checked-and-tried',
    password: 'gauge jaws',
  });
});

it('a wrong password keeps the meaning and counts the tries', async () => {
  const { password } = openDialog();
  fireEvent.click(screen.getByLabelText(/tried on a station/));
  fireEvent.change(password, { target: { value: 'jaws' } });
  sign();
  expect(await screen.findByText('Not the password. Enter it again.')).toBeTruthy();
  sign();
  expect(await screen.findByText('Not the password. Enter it again. Tried 2 times.')).toBeTruthy();
  expect(screen.getByLabelText<HTMLInputElement>(/tried on a station/).checked).toBe(true);
});

it('the writer sees no release button, others both, and nobody any while nothing waits', () => {
  const b = { head: head(2), sequence: sequences[1]!.sequence };
  const buttons = (mayRelease: boolean, mayTakeBack: boolean) => {
    cleanup();
    const page = { b, heads: [b.head], mayRelease, mayTakeBack };
    render(
      <ToastProvider>
        <ReleaseButtons page={page} signer="A. Boyle" release={release} sendBack={release} />
      </ToastProvider>,
    );
    return screen.queryAllByRole('button').map((button) => button.textContent);
  };
  expect(buttons(false, true)).toEqual(['Take back with a reason…']);
  expect(buttons(true, false)).toEqual(['Send back with a reason…', 'Sign and release r2…']);
  expect(buttons(false, false)).toEqual([]);
});

it('the comparison strikes out what was and underlines what is, and says the rest is the same', () => {
  const before = sequences[1]!.sequence;
  const after: Sequence = {
    ...before,
    steps: before.steps.map((step): Step => (step.kind === 'verify' ? { ...step, repeats: 5 } : step)),
  };
  const page = {
    boardType: cb2420,
    a: { head: head(1), sequence: before },
    b: { head: head(2), sequence: after },
  } as ComparisonPage;
  const comparison = compareSequences(before, after);
  const { container } = render(<ComparisonTable page={page} comparison={comparison} rows={comparison.steps} />);
  expect([...container.querySelectorAll('del')].map((each) => each.textContent)).toEqual(['3']);
  expect([...container.querySelectorAll('ins')].map((each) => each.textContent)).toEqual(['5']);
  expect(screen.getByRole('img', { name: 'Repeats: 3 is now 5' })).toBeTruthy();
  // Eleven other steps and the rule of decision.
  expect(screen.getAllByText('the same')).toHaveLength(12);
});

it('problems of a file are told by line, field and reason, and that nothing was stored', () => {
  render(<FileProblems problems={[{ line: 7, field: 'step 2, volts', reason: 'It is missing.' }]} />);
  expect(screen.getByRole('alert').textContent).toContain('Nothing was stored.');
  expect(screen.getAllByRole('cell').map((cell) => cell.textContent)).toEqual(['7', 'step 2, volts', 'It is missing.']);
});
