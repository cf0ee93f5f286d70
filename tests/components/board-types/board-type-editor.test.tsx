// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { BoardTypeEditor } from '@/components/desk/board-types/board-type-editor';
import type { BoardTypeActions } from '@/components/desk/board-types/draft-actions';
import { ToastProvider } from '@/components/ui/toast';
import { cb1210 } from '@/db/seed/board-types';
import type { BoardType } from '@/lib/contracts/board-type';
import type { BoardTypePage, BoardTypeRevisionHead } from '@/lib/contracts/board-type-revision';

vi.mock('next/navigation', () => ({ useRouter: () => ({ refresh: () => {}, push: () => {} }) }));

/** Stands for the worker of the prediction: only what it was asked. */
const asked: unknown[] = [];
class SilentWorker {
  postMessage(question: unknown) {
    asked.push(question);
  }
  terminate() {}
}

const head: BoardTypeRevisionHead = {
  id: '0d5f6a31-9d5e-4c11-8f67-2f9f4f7f1a01',
  number: 2,
  status: 'draft',
  version: 4,
  note: '',
  madeBy: 'T. Marsden',
  savedAtIso: '2026-11-30T10:52:00.000Z',
  submittedBy: null,
  submittedAtIso: null,
  sentBackBy: null,
  sentBackAtIso: null,
  sentBackReason: null,
  approvedBy: null,
  approvedAtIso: null,
  specification: cb1210,
};

function open(over: Partial<BoardTypeRevisionHead> = {}, more: Partial<BoardTypePage> = {}) {
  const shown = { ...head, ...over };
  const page: BoardTypePage = {
    code: 'CB1210',
    shown,
    inUse: null,
    history: [shown],
    misfits: [],
    files: [],
    openLots: [],
    mayEdit: true,
    mayApprove: false,
    ...more,
  };
  const save = vi.fn<BoardTypeActions['save']>(() => Promise.resolve({ ok: true, value: { version: 5 } }));
  const none = () => Promise.resolve({ ok: true as const, value: null });
  const actions: BoardTypeActions = {
    begin: () => Promise.resolve({ ok: true, value: { revisionId: '', number: 1 } }),
    save,
    discard: none,
    ask: none,
    takeBack: none,
    approve: none,
    sendBack: none,
  };
  const { unmount } = render(
    <ToastProvider>
      <BoardTypeEditor page={page} signer="T. Marsden" actions={actions} />
    </ToastProvider>,
  );
  return { save, unmount };
}

const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label, { exact: true, selector: 'input' });
function type(label: string, text: string): void {
  act(() => field(label).focus());
  fireEvent.change(field(label), { target: { value: text } });
  act(() => field(label).blur());
}
const button = (name: string | RegExp) => screen.getByRole('button', { name });

beforeEach(() => {
  vi.stubGlobal('Worker', SilentWorker);
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      disconnect() {}
    },
  );
  Element.prototype.scrollIntoView = () => {};
  asked.length = 0;
  sessionStorage.clear();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('values in the circuit', () => {
  test('the tab key follows the drawing from left to right', () => {
    open();
    const all = [...document.querySelectorAll('input')].map((input) => input.getAttribute('aria-label'));
    expect(all.slice(0, 9)).toEqual([
      'C1 reservoir',
      'C1 reservoir, tolerance',
      'R1 upper end',
      'R1 upper end, tolerance',
      'RV1 trimmer',
      'RV1 trimmer, tolerance',
      'Travel',
      'R2 lower end',
      'R2 lower end, tolerance',
    ]);
  });

  test('a value typed as engineers do is written out when the field is left, and saved as a number', async () => {
    const { save } = open();
    type('R5 feedback', '110k');
    expect(field('R5 feedback').value).toBe('110 kΩ');
    fireEvent.click(button('Save the draft'));
    await vi.waitFor(() => expect(save).toHaveBeenCalledOnce());
    expect(save.mock.calls[0]![0]).toMatchObject({
      revisionId: head.id,
      version: 4,
      specification: { design: { feedbackOhms: 110_000 } },
    });
    await screen.findByText('Nothing to save.');
  });

  test('a text that is no value stays, with its sentence; nothing is saved and the field has the focus', () => {
    const { save } = open();
    type('R5 feedback', 'large');
    expect(field('R5 feedback').value).toBe('large');
    expect(field('R5 feedback')).toHaveProperty('ariaInvalid', 'true');
    const says = document.getElementById(field('R5 feedback').getAttribute('aria-describedby')!);
    expect(says?.textContent).toBe('“large” is not a value. Write it such as 4.7 kΩ.');
    expect(screen.getByText('1 error to fix')).toBeDefined();
    fireEvent.click(button('Save the draft'));
    expect(save).not.toHaveBeenCalled();
    expect(document.activeElement).toBe(field('R5 feedback'));
  });

  test('limits against each other stop the asking, with the sentence under the field', () => {
    open();
    type('Release point, at least', '10.8');
    expect(screen.getByText(/The release point lies above the trip point/)).toBeDefined();
    expect(button('Ask for approval').getAttribute('aria-disabled')).toBe('true');
  });
});

test('what was typed and not saved is shown again in this tab, and can be given up', async () => {
  const first = open();
  type('R5 feedback', '120k');
  first.unmount();
  open();
  expect(await screen.findByText(/did not save is shown again/)).toBeDefined();
  expect(field('R5 feedback').value).toBe('120 kΩ');
  fireEvent.click(button('Go back to what is saved'));
  expect(field('R5 feedback').value).toBe('105 kΩ');
});

test('a link asks before it leaves what is not saved', async () => {
  open(
    {},
    { misfits: [{ sequenceId: 'a', name: 'End of line', revision: 'r6', sentences: ['The trim aims outside.'] }] },
  );
  type('R5 feedback', '120k');
  fireEvent.click(screen.getByRole('link', { name: 'End of line r6' }));
  expect(within(await screen.findByRole('dialog')).getByText(/Leave without saving/, { selector: 'h2' })).toBeDefined();
});

test('the prediction is asked once for a value, not for each key, and not for a name', async () => {
  open();
  await vi.waitFor(() => expect(asked).toHaveLength(1));
  for (const text of ['1', '11', '110', '110k']) fireEvent.change(field('R5 feedback'), { target: { value: text } });
  await vi.waitFor(() => expect(asked).toHaveLength(2));
  expect((asked[1] as BoardType).design.feedbackOhms).toBe(110_000);
  fireEvent.change(field('Name'), { target: { value: 'Another name' } });
  await new Promise((done) => setTimeout(done, 400));
  expect(asked).toHaveLength(2);
});

test('the frame around the trimmer is moved and sized by keys', () => {
  const frame = { x: 0.4, y: 0.4, width: 0.2, height: 0.2 };
  open({ specification: { ...cb1210, trimmerPhoto: { fileId: '5b1c0a58-2f0e-4f6b-9d0e-1c1210000001', frame } } });
  const handle = button(/^Frame around the trimmer/);
  fireEvent.keyDown(handle, { key: 'ArrowRight' });
  fireEvent.keyDown(handle, { key: 'ArrowUp' });
  fireEvent.keyDown(handle, { key: 'ArrowDown', shiftKey: true });
  expect(handle.getAttribute('aria-label')).toBe(
    'Frame around the trimmer: 41 % from the left, 39 % from the top, 20 % wide, 21 % high',
  );
});

describe('what waits for approval', () => {
  const waits = { status: 'submitted', submittedBy: 'T. Marsden', note: 'Narrower, as the drawing says' } as const;
  test('cannot be typed into, and its writer never sees the button that approves', () => {
    open(waits);
    expect(field('R5 feedback').readOnly).toBe(true);
    expect(screen.queryByRole('button', { name: /Approve/ })).toBeNull();
    expect(button('Take it back')).toBeDefined();
  });

  test('is approved in a dialog that says what changed, what it means and asks for the password', async () => {
    const specification = { ...cb1210, limits: { ...cb1210.limits, releaseVolts: { min: 12.1, max: 12.4 } } };
    open(
      { ...waits, specification },
      { inUse: { ...head, number: 1, status: 'approved' }, mayEdit: false, mayApprove: true },
    );
    fireEvent.click(button('Approve…'));
    const dialog = within(await screen.findByRole('dialog'));
    expect(dialog.getByText('12.40 V')).toBeDefined();
    expect(dialog.getByText('Narrower, as the drawing says')).toBeDefined();
    expect(dialog.getByLabelText('Password of T. Marsden')).toBeDefined();
  });
});
