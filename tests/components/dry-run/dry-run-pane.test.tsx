// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, expect, test, vi } from 'vitest';
import { DryRunPane } from '@/components/desk/dry-run/dry-run-pane';
import type { DryRunHandle } from '@/components/desk/dry-run/use-dry-run';
import { cb1210 } from '@/db/seed/board-types';
import { usualDryRun, type DryRunView } from '@/lib/contracts/dry-run';
import { summarisePair, summariseSide } from '@/lib/dry-run/summarise';

afterEach(cleanup);

const outcomes = (passed: number) =>
  Array.from({ length: 100 }, (_, i) => ({
    verdict: i < passed ? ('pass' as const) : ('reject' as const),
    reason: i < passed ? null : ('trip-too-low' as const),
    stepId: i < passed ? null : 's7',
    tripVolts: 10.8,
    releaseVolts: 12.3,
    seconds: 24 + passed / 50,
    personSeconds: 10,
    good: i < passed,
  }));
const [draft, released] = [outcomes(90), outcomes(98)];
const view = (over: Partial<DryRunView>): DryRunView => ({
  id: 'a',
  state: 'done',
  settings: { ...usualDryRun, boards: 100 },
  revisionNumber: 7,
  draftVersion: 3,
  releasedNumber: 6,
  done: 200,
  of: 200,
  leftMs: null,
  result: {
    draft: summariseSide(draft),
    released: summariseSide(released),
    pair: summarisePair(draft, released),
    changesAlone: [],
    elapsedMs: 1000,
  },
  problem: null,
  kept: false,
  askedBy: 'T. Marsden',
  askedAtIso: '2026-11-25T10:00:00.000Z',
  ...over,
});

function show(shown: DryRunView | null) {
  const dryRun = {
    view: shown,
    isAtWork: shown?.state === 'running',
    problem: null,
    asking: false,
    start: vi.fn(async () => undefined),
    stop: vi.fn(async () => undefined),
    keep: vi.fn(async () => undefined),
  } satisfies DryRunHandle;
  render(
    <DryRunPane
      dryRun={dryRun}
      boardType={cb1210}
      revisionNumber={7}
      draftVersion={4}
      addressOf={(id) => `/runs/${id}`}
      stations={[]}
      blocked={null}
    />,
  );
  return dryRun;
}

test('says both yields, whether their difference is more than chance, and that the draft has changed since', () => {
  show(view({}));
  const said = document.body.textContent;
  expect(said).toContain('90.0 % would pass first time, r6 gives 98.0 %');
  expect(said).toContain('The loss of 8.0 points is more than chance.');
  expect(said).toContain('The draft has changed since.');
});

test('while it runs its fields are locked and it can be stopped', () => {
  const dryRun = show(view({ state: 'running', done: 50, leftMs: 6_000 }));
  expect(screen.getByLabelText<HTMLInputElement>('Seed').disabled).toBe(true);
  expect(document.body.textContent).toContain('50 of 200');
  expect(document.body.textContent).toContain('about 6 s left');
  fireEvent.click(screen.getByRole('button', { name: 'Stop the dry run' }));
  expect(dryRun.stop).toHaveBeenCalled();
});

test('a value that cannot be is told beside the fields and starts nothing; put right, it starts with all of them', () => {
  const dryRun = show(null);
  fireEvent.change(screen.getByLabelText('Boards'), { target: { value: '5' } });
  fireEvent.click(screen.getByRole('button', { name: 'Start a dry run' }));
  expect(screen.getByRole('alert').textContent).toContain('Use at least 20 boards.');
  expect(dryRun.start).not.toHaveBeenCalled();
  fireEvent.change(screen.getByLabelText('Boards'), { target: { value: '500' } });
  fireEvent.change(screen.getByLabelText('Boards with a defect, percent'), { target: { value: '7,5' } });
  fireEvent.click(screen.getByRole('button', { name: 'Start a dry run' }));
  expect(dryRun.start).toHaveBeenCalledWith({ ...usualDryRun, boards: 500, defectRate: 0.075 });
});
