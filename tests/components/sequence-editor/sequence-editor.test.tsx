// @vitest-environment jsdom
import { act, cleanup, fireEvent, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { setFieldValue } from '@/lib/sequence/set-field-value';
import { openEditor, sequence, storing, type Save } from './open-editor';

// Predictions have tests of their own and take most of a second here.
vi.mock('@/lib/prediction/predict-sequence', () => ({
  predictSequence: () => ({
    steps: [],
    supply: [{ atMs: 0, volts: 0 }],
    loadOn: [],
    flips: [],
    totalMs: 0,
    personMs: 0,
    ending: { verdict: 'pass', reason: null, stepId: null },
  }),
}));
vi.mock('next/navigation', () => ({ useRouter: () => ({ push: vi.fn(), refresh: vi.fn() }) }));

beforeEach(() => {
  localStorage.clear();
  window.ResizeObserver ??= class {
    observe() {}
    unobserve() {}
    disconnect() {}
  };
  Element.prototype.scrollIntoView ??= () => {};
  vi.stubGlobal('fetch', () => new Promise(() => {}));
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

// By selector: asking by role for every field of every step takes seconds in jsdom.
const find = <T extends HTMLElement>(selector: string, within: ParentNode = document) => [
  ...within.querySelectorAll<T>(selector),
];
const rows = () => find('ol[aria-label=Steps] > li > div');
const labelOf = (each: Element) => each.getAttribute('aria-label') ?? '';
const row = (name: RegExp) => rows().find((each) => name.test(labelOf(each)))!;
const field = (step: RegExp, label: string) => find<HTMLInputElement>(`[aria-label="${label}"]`, row(step))[0]!;
const button = (name: RegExp) =>
  find('button').find((each) => name.test(labelOf(each)) || name.test(each.textContent ?? ''))!;
const limit = () => field(/Power up/, 'Current limit, A');
const type = (input: HTMLElement, value: string) => {
  act(() => input.focus());
  fireEvent.change(input, { target: { value } });
};
const press = (target: HTMLElement, key: string, more: object = {}) =>
  fireEvent.keyDown(target, { key, code: key, ...more });
const undo = (more: object = {}) => press(limit(), 'z', { code: 'KeyZ', ctrlKey: true, ...more });

describe('typing into a blank', () => {
  it('keeps a text that cannot be read, with a sentence under its row', () => {
    openEditor();
    type(limit(), '0.6 of');
    fireEvent.blur(limit());
    expect(limit().value).toBe('0.6 of');
    expect(limit()).toHaveProperty('ariaInvalid', 'true');
    const message = document.getElementById(limit().getAttribute('aria-describedby')!)!;
    expect(message.textContent).toContain('“0.6 of” is not a number of A.');
    expect(button(/error.? to fix/)).toBeTruthy();
  });

  it('takes a comma and the unit, and shows the usual decimals once left', () => {
    openEditor();
    type(limit(), '0,7 A');
    expect(limit().value).toBe('0,7 A');
    fireEvent.blur(limit());
    expect(limit().value).toBe('0.700');
  });

  it('shows what the field is in the revision in use, and marks the row', () => {
    openEditor();
    const before = limit().value;
    type(limit(), '0.7');
    expect(row(/Power up/).textContent).toContain(`(was ${before})`);
    expect(row(/Power up/).textContent).toContain('changed since r6');
    expect(row(/Trim/).textContent).not.toContain('changed since r6');
  });

  it('one tap mends what a rule says', () => {
    const steps = sequence.steps.map((step) =>
      step.kind === 'find-points' ? setFieldValue(step, 'windowMaxVolts', 30) : step,
    ) as typeof sequence.steps;
    openEditor({ sequence: { ...sequence, steps } });
    const input = field(/Find points/, 'Window to, V');
    expect(input).toHaveProperty('ariaInvalid', 'true');
    fireEvent.click(button(/^Use .* V$/));
    expect(Number(field(/Find points/, 'Window to, V').value)).toBeLessThan(30);
    expect(row(/Find points/).textContent).not.toContain('absolute maximum');
  });
});

describe('undo', () => {
  it('takes typing in one field back as one, and redo brings it again', () => {
    openEditor();
    const before = limit().value;
    for (const text of ['0', '0.', '0.7', '0.75']) type(limit(), text);
    undo();
    expect(limit().value).toBe(before);
    undo({ shiftKey: true });
    expect(limit().value).toBe('0.75');
  });

  it('reaches across steps and brings back a removed one', () => {
    openEditor();
    act(() => limit().focus());
    press(limit(), 'Delete', { altKey: true });
    expect(rows()).toHaveLength(5);
    press(document.body, 'z', { code: 'KeyZ', ctrlKey: true });
    expect(rows().map(labelOf)).toContain('Step 2, Power up');
  });
});

describe('steps', () => {
  const order = () => rows().map((each) => labelOf(each).replace(/Step \d+, /, ''));

  it('move by Alt and arrows, told aloud', () => {
    openEditor();
    const target = field(/Trim/, 'Target, V');
    act(() => target.focus());
    press(target, 'ArrowUp', { altKey: true });
    expect(order().slice(2, 4)).toEqual(['Trim', 'Find points']);
    expect(document.body.textContent).toContain('Trim is now step 3.');
  });

  it('are added by keyboard from a list that typing narrows', async () => {
    openEditor();
    act(() => limit().focus());
    press(limit(), 'n', { code: 'KeyN', altKey: true });
    const search = find('[role=combobox]')[0]!;
    fireEvent.change(search, { target: { value: 'drift' } });
    press(search, 'Enter');
    await waitFor(() => expect(order()[2]).toBe('Soak'));
  });

  it('are switched off and stay readable', () => {
    openEditor();
    fireEvent.click(button(/^Run step 4, Trim$/));
    expect(row(/Trim, off/)).toBeTruthy();
    expect(field(/Trim/, 'Target, V').value).not.toBe('');
  });

  it('take a name', () => {
    openEditor();
    press(limit(), 'F2');
    const name = find('input[aria-label="Name of step 2"]')[0]!;
    fireEvent.change(name, { target: { value: 'Gentle start' } });
    press(name, 'Enter');
    expect(order()[1]).toBe('Gentle start');
  });
});

describe('saving', () => {
  it('sends what was typed a moment after the last key', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    const save = storing();
    openEditor({}, save);
    type(limit(), '0.7');
    type(limit(), '0.75');
    expect(save).not.toHaveBeenCalled();
    await act(() => vi.advanceTimersByTimeAsync(700));
    expect(save).toHaveBeenCalledTimes(1);
    expect(save.mock.calls[0]![0]).toMatchObject({ version: 4 });
    expect(save.mock.calls[0]![0].sequence.steps[1]).toMatchObject({ currentLimitAmps: 0.75 });
    await act(() => vi.advanceTimersByTimeAsync(5_000));
    expect(save).toHaveBeenCalledTimes(1);
  });

  it('keeps text in the browser and sends it again while the server does not answer', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    const save = vi.fn<Save>(() => Promise.reject(new Error('offline')));
    const first = openEditor({}, save);
    type(limit(), '0.75');
    await act(() => vi.advanceTimersByTimeAsync(700));
    expect(find('[role=alert]')[0]!.textContent).toContain('not saved: the server does not answer');
    await act(() => vi.advanceTimersByTimeAsync(3_100));
    expect(save).toHaveBeenCalledTimes(2);
    first.unmount();
    openEditor();
    expect(limit().value).toBe('0.750');
  });

  it('a text that cannot be read survives a reload too', () => {
    const first = openEditor();
    type(limit(), 'about 0.7');
    first.unmount();
    openEditor();
    expect(limit().value).toBe('about 0.7');
  });
});

describe('two editors', () => {
  const theirs = (field: string, value: number): Save =>
    vi.fn<Save>((form) =>
      Promise.resolve(
        form.version > 4
          ? { ok: true, value: { saved: true, version: form.version + 1, savedAtIso: '2026-11-30T10:54:00.000Z' } }
          : {
              ok: true,
              value: {
                saved: false,
                version: 5,
                savedAtIso: '2026-11-30T10:53:00.000Z',
                savedBy: 'K. Osei',
                warningReasons: {},
                sequence: {
                  ...sequence,
                  steps: sequence.steps.map((step) => (step.id === 's2' ? setFieldValue(step, field, value) : step)),
                },
              },
            },
      ),
    );

  it('different fields both stand', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    openEditor({}, theirs('settleMs', 400));
    type(limit(), '0.75');
    await act(() => vi.advanceTimersByTimeAsync(700));
    expect(limit().value).toBe('0.75');
    expect(field(/Power up/, 'Settle time, ms').value).toBe('400');
  });

  it('the same field keeps mine and offers theirs; theirs stays stored until I choose', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    const save = theirs('currentLimitAmps', 0.9);
    openEditor({}, save);
    type(limit(), '0.75');
    await act(() => vi.advanceTimersByTimeAsync(700));
    expect(limit().value).toBe('0.75');
    expect(row(/Power up/).textContent).toContain('Current limit: K. Osei saved 0.900 A.');
    await act(() => vi.advanceTimersByTimeAsync(2_000));
    expect(save).toHaveBeenCalledTimes(1);
    fireEvent.click(button(/^Keep 0.750 A$/));
    await act(() => vi.advanceTimersByTimeAsync(700));
    expect(vi.mocked(save).mock.calls[1]![0]).toMatchObject({ version: 5 });
    expect(vi.mocked(save).mock.calls[1]![0].sequence.steps[1]).toMatchObject({ currentLimitAmps: 0.75 });
    expect(document.body.textContent).not.toContain('K. Osei saved 0.900');
  });
});

describe('a draft that is locked', () => {
  it('is read as sentences, without fields', () => {
    openEditor({ mayEdit: false });
    expect(document.body.textContent).toContain('You may look at it');
    expect(find('input, select', document.querySelector('ol')!)).toEqual([]);
    expect(row(/Power up/).textContent).toMatch(/current limit [\d.]+ A/);
  });
});
