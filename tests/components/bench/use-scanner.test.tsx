// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { useScanner } from '@/components/bench/scanner/use-scanner';
import { useTypedKeys } from '@/components/bench/scanner/typed-keys';

const onScan = vi.fn();
const onStop = vi.fn();
const onFilled = vi.fn();
const onTyped = vi.fn();

function Bench() {
  const [value, setValue] = useState('');
  useScanner({ onScan, onStop });
  useTypedKeys(onTyped);
  return (
    <>
      <input aria-label="field" value={value} onChange={(event) => setValue(event.target.value)} />
      <button type="button" data-filled="" onClick={onFilled}>
        Go on
      </button>
    </>
  );
}

beforeEach(() => {
  vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout', 'Date'] });
  vi.clearAllMocks();
  render(<Bench />);
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

const wait = (ms: number) => act(() => vi.advanceTimersByTime(ms));
function keys(text: string, gapMs: number) {
  for (const key of text) {
    fireEvent.keyDown(document.activeElement ?? document.body, { key });
    wait(gapMs);
  }
}
const press = (key: string) => fireEvent.keyDown(document.activeElement ?? document.body, { key });
const field = () => screen.getByLabelText<HTMLInputElement>('field');

describe('the scanner at the bench', () => {
  it('works without focus', () => {
    keys('CB1210264800184', 5);
    press('Enter');
    expect(onScan).toHaveBeenCalledExactlyOnceWith('CB1210264800184');
  });

  it('never types into a field that has the focus', () => {
    field().focus();
    keys('CB1210264800184', 5);
    press('Enter');
    wait(500);
    expect(onScan).toHaveBeenCalledOnce();
    expect(field().value).toBe('');
  });

  it('lets a hand write in a field', () => {
    field().focus();
    keys('R14', 160);
    wait(200);
    expect(field().value).toBe('R14');
    expect(onScan).not.toHaveBeenCalled();
  });

  it('hands on what is typed with no field in focus', () => {
    keys('47', 200);
    wait(200);
    expect(onTyped.mock.calls.flat()).toEqual(['4', '7']);
  });

  it('always stops on Escape, also from a field', () => {
    field().focus();
    press('Escape');
    expect(onStop).toHaveBeenCalledOnce();
  });

  it('presses the filled button on Enter, but not within 300 ms of scanner input', () => {
    keys('SWN-R3', 5);
    press('Enter');
    wait(200);
    press('Enter');
    expect(onFilled).not.toHaveBeenCalled();
    wait(400);
    press('Enter');
    expect(onFilled).toHaveBeenCalledOnce();
  });
});
