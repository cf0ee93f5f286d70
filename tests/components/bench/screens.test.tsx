// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { NextIntlClientProvider } from 'next-intl';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { BenchProvider } from '@/components/bench/bench-context';
import { BenchScreen } from '@/components/bench/bench-screen';
import { createReadingStore } from '@/components/bench/live/reading-store';
import { benchCatalogue, benchLocales } from '@/lib/messages/bench-locales';
import { benchCommandSchema } from '@/lib/contracts/bench-command';
import { standingFlood } from '@/tests/browser/gallery/standing-flood';
import type { GalleryView } from '@/tests/browser/gallery/samples';
import { trialOffer } from '@/tests/browser/gallery/trial-views';
import { galleryViews } from '@/tests/browser/gallery/views';

afterEach(cleanup);

function show(name: string, change: Partial<GalleryView> = {}, locale = 'en') {
  const shown = { ...galleryViews[name]!, ...change };
  const send = vi.fn();
  const problems: string[] = [];
  render(
    <NextIntlClientProvider
      {...benchCatalogue(locale)}
      timeZone="UTC"
      onError={(error) => problems.push(error.message)}
    >
      <BenchProvider
        value={{
          view: shown.view,
          leads: shown.leads ?? true,
          lost: shown.lost ?? false,
          refusal: shown.view.refusal,
          readings: createReadingStore(),
          send,
          sound: 'on',
          toggleSound: () => {},
        }}
      >
        <BenchScreen flood={standingFlood(shown.view)} />
      </BenchProvider>
    </NextIntlClientProvider>,
  );
  return { send, problems };
}

describe.each(benchLocales)('every screen in $name', ({ locale }) => {
  it.each(Object.keys(galleryViews))('%s has all its texts', (name) => {
    const { problems } = show(name, {}, locale);
    expect(problems).toEqual([]);
    expect(document.body.textContent).not.toMatch(/\b(bench|say|run)\.[a-z]/);
  });
});

describe('what a screen sends', () => {
  const presses: [string, RegExp, object][] = [
    ['01-prompted-clockwise', /will not turn/i, { kind: 'will-not-turn' }],
    ['01-prompted-clockwise', /^stop$/i, { kind: 'stop' }],
    ['a1-first-beep', /end test/i, { kind: 'stop' }],
    ['a5-no-effect', /screw found/i, { kind: 'screw-found' }],
    ['a5-no-effect', /call engineer/i, { kind: 'call-engineer' }],
    ['seal-screw', /screw is sealed/i, { kind: 'confirm', what: 'sealed' }],
    ['seat-confirm', /board in, lid closed/i, { kind: 'confirm', what: 'lid-and-board' }],
    ['operator-check', /^yes$/i, { kind: 'answer', ok: true }],
    ['operator-check', /^no$/i, { kind: 'answer', ok: false }],
    ['instruction-supply-off', /^done$/i, { kind: 'confirm', what: 'instruction-done' }],
    ['instruction-supply-on', /^done$/i, { kind: 'confirm', what: 'instruction-done' }],
    ['03-pass', /print label again/i, { kind: 'print-label-again' }],
    ['05-fault', /try again/i, { kind: 'try-again' }],
    ['02-idle', /end shift/i, { kind: 'end-shift' }],
    ['b2-pin', /another badge/i, { kind: 'another-badge' }],
    ['daily-check', /continue/i, { kind: 'continue' }],
    ['commissioning', /continue/i, { kind: 'continue' }],
    ['offer-idle', /start the trial/i, { kind: 'start-trial', offerId: trialOffer.offerId }],
    ['offer-choose-lot', /start the trial/i, { kind: 'start-trial', offerId: trialOffer.offerId }],
    ['trial-may-not-test', /leave the trial/i, { kind: 'leave-trial' }],
    ['trial-pass', /leave the trial/i, { kind: 'leave-trial' }],
    ['trial-reject', /end the offer/i, { kind: 'end-trial' }],
  ];
  it.each(presses)('%s: %s', (name, button, command) => {
    const { send } = show(name);
    fireEvent.click(screen.getByRole('button', { name: button }));
    expect(send).toHaveBeenCalledExactlyOnceWith(command);
    expect(benchCommandSchema.safeParse(command).success).toBe(true);
  });

  it('sends a PIN only once four digits are typed', () => {
    const { send } = show('b2-pin');
    for (const digit of ['4', '7', '1']) fireEvent.click(screen.getByRole('button', { name: digit }));
    fireEvent.click(screen.getByRole('button', { name: /sign in after 4/i }));
    expect(send).not.toHaveBeenCalled();
    fireEvent.click(screen.getByRole('button', { name: '1' }));
    fireEvent.click(screen.getByRole('button', { name: /^sign in$/i }));
    expect(send).toHaveBeenCalledExactlyOnceWith({ kind: 'pin', digits: '4711' });
  });

  it('compares a serial number typed by hand before it sends it', () => {
    const { send } = show('02-idle');
    fireEvent.click(screen.getByRole('button', { name: /enter by hand/i }));
    const dialog = within(screen.getByRole('dialog'));
    const type = (label: RegExp, value: string) =>
      fireEvent.change(dialog.getByLabelText(label), { target: { value } });
    type(/^serial number$/i, 'CB1210264800184');
    type(/again/i, 'CB1210264800148');
    fireEvent.click(dialog.getByRole('button', { name: /use this number/i }));
    expect(send).not.toHaveBeenCalled();
    expect(dialog.getByRole('alert').textContent).toMatch(/differ/i);
    type(/again/i, 'cb1210264800184');
    fireEvent.click(dialog.getByRole('button', { name: /use this number/i }));
    expect(send).toHaveBeenCalledExactlyOnceWith({
      kind: 'serial-by-hand',
      serial: 'CB1210264800184',
      again: 'CB1210264800184',
    });
  });
});

describe('what a screen may say', () => {
  it('tells the operator to open the lid for an instruction only after the read-back, and takes no "done" before', () => {
    show('instruction-supply-off');
    expect(document.body.textContent).toContain('Supply is off. You may open the lid.');
    expect(screen.getByRole('img', { name: 'Picture of what to do' }).getAttribute('src')).toMatch(
      /^\/api\/files\/2f0c/,
    );
    cleanup();
    show('instruction-waits');
    expect(document.body.textContent).not.toContain('You may open the lid');
    expect(screen.queryByRole('button', { name: /^done$/i })).toBeNull();
    cleanup();
    show('instruction-supply-on');
    expect(document.body.textContent).not.toContain('You may open the lid');
    expect(document.body.textContent).toContain('Keep the lid closed.');
  });

  it('says how long a soak still takes', () => {
    show('soak');
    expect(document.body.textContent).toContain('12 of 40 done, about 3 min left');
  });

  const inTrial = Object.keys(galleryViews).filter((name) => galleryViews[name]!.view.engineering);
  it.each(inTrial)('%s says that it is no production', (name) => {
    show(name);
    expect(screen.getAllByText('Engineering run. Not production.').length).toBeGreaterThan(0);
    expect(screen.queryByRole('button', { name: /print label again/i })).toBeNull();
    expect(document.body.textContent).not.toMatch(/red bin|Lot 2648-B|waits for quality/);
  });

  it('says that the supply is off only after the read-back', () => {
    show('05-fault');
    expect(document.body.textContent).toContain('Supply is off.');
    cleanup();
    show('fault-not-confirmed');
    expect(document.body.textContent).not.toContain('Supply is off.');
    expect(document.body.textContent).toContain(
      'The supply may still be on. Keep the lid closed. Switch the supply off at its front.',
    );
  });

  it('does not call 2 V or more safe', () => {
    const { view } = galleryViews['05-fault']!;
    show('05-fault', { view: { ...view, run: { ...view.run!, supply: { state: 'off', volts: 2 } } } });
    expect(document.body.textContent).not.toContain('Supply is off.');
    expect(document.body.textContent).not.toContain('Safe');
  });

  it('gives a watching screen no actions and says so', () => {
    show('watching');
    expect(screen.queryByRole('button', { name: /will not turn|end test|menu/i })).toBeNull();
    expect(document.body.textContent).toContain('This screen watches.');
  });

  it('makes a lost connection an alert', () => {
    show('lost');
    expect(screen.getAllByRole('alert').some((alert) => /no connection/i.test(alert.textContent ?? ''))).toBe(true);
  });

  it('asks for the bin of a reject and locks nothing else away', () => {
    show('04-reject');
    expect(document.body.textContent).toContain('Scan the label on bin R3');
    expect(document.body.textContent).toContain('12.71');
  });

  it('never lets a label that failed hide the next move', () => {
    show('idle-label-failed');
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Scan a board');
    expect(document.body.textContent).toContain('Testing goes on.');
  });
});
