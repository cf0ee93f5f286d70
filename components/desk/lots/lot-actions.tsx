'use client';

import { useState } from 'react';
import { Button, ButtonLink } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { HoldPanel } from '@/components/ui/hold-panel';
import { useToast } from '@/components/ui/toast';
import type { LotChange } from '@/lib/contracts/lot';
import type { LotPage } from '@/lib/contracts/lot-page';
import type { Outcome } from '@/lib/contracts/outcome';
import type { ReasonChoice } from '@/lib/contracts/reason-code';
import type { ReasonCodeUse } from '@/lib/contracts/stored-states';
import { count } from '../numbers';
import { ReasonDialog } from '../reason-dialog';
import { Time } from '../time';

export interface LotActionsOf {
  change: (input: unknown) => Promise<Outcome>;
  hold: (input: unknown) => Promise<Outcome>;
  release: (input: unknown) => Promise<Outcome>;
}

interface LotActionsProps {
  lot: LotPage;
  actions: LotActionsOf;
  reasons: readonly ReasonChoice[];
  onChanged: () => void;
}

const done: Record<LotChange, string> = { open: 'open', pause: 'paused', close: 'closed' };

const wordsFor = (use: ReasonCodeUse, reasons: readonly ReasonChoice[]) =>
  reasons.filter((reason) => reason.use === use).map(({ word }) => word);

/** Pause, open, close, hold. Pausing can be undone; closing and holding ask first. */
export function LotActions({ lot, actions, reasons, onChanged }: LotActionsProps) {
  const toast = useToast();
  const [asking, setAsking] = useState<'close' | 'hold' | null>(null);
  const [busy, setBusy] = useState(false);
  const { id, code, state, hold, summary } = lot;
  const left = summary.size - summary.tested;

  async function change(to: LotChange, undo?: LotChange): Promise<void> {
    setBusy(true);
    const outcome = await actions.change({ lotId: id, change: to }).catch(() => null);
    setBusy(false);
    setAsking(null);
    if (outcome?.ok) toast(`Lot ${code} is ${done[to]}`, undo ? () => void change(undo) : undefined);
    else toast(outcome?.sentence ?? 'The server did not answer. Nothing was changed. Try again.');
    onChanged();
  }

  return (
    <>
      {state === 'open' ? (
        <Button onClick={() => void change('pause', 'open')} pending={busy ? 'Storing' : null}>
          Pause
        </Button>
      ) : (
        <Button onClick={() => void change('open')} pending={busy ? 'Storing' : null}>
          {state === 'closed' ? 'Open again' : 'Open'}
        </Button>
      )}
      {state === 'closed' ? null : <Button onClick={() => setAsking('close')}>Close the lot</Button>}
      {hold ? null : <Button onClick={() => setAsking('hold')}>Hold the lot</Button>}
      <Dialog
        open={asking === 'close'}
        onOpenChange={(open) => !open && setAsking(null)}
        title={`Close lot ${code}?`}
        consequence={
          left > 0
            ? `${left} of ${summary.size} boards have no verdict. No bench tests a closed lot.`
            : 'No bench tests a closed lot. It can be opened again.'
        }
        actions={
          <>
            <Button kind="filled" onClick={() => void change('close', 'open')} pending={busy ? 'Storing' : null}>
              Close the lot
            </Button>
            <Button kind="link" data-safe onClick={() => setAsking(null)}>
              Keep it {state}
            </Button>
          </>
        }
      />
      <ReasonDialog
        open={asking === 'hold'}
        onClose={() => setAsking(null)}
        title={`Hold lot ${code}?`}
        consequence="No board of it is tested until the hold is released. Your reason is recorded."
        verb="Hold the lot"
        keep="Keep it going"
        words={wordsFor('hold', reasons)}
        send={(reason) => actions.hold({ lotId: id, reason })}
        onDone={() => {
          setAsking(null);
          toast(`Lot ${code} is on hold`);
          onChanged();
        }}
      />
    </>
  );
}

/** Why a lot is held, by whom, and the release. */
export function LotHold({ lot, mayRelease, actions, reasons, onChanged }: LotActionsProps & { mayRelease: boolean }) {
  const toast = useToast();
  const [asking, setAsking] = useState(false);
  if (!lot.hold) return null;
  const { reason, byName, sinceIso, suspects } = lot.hold;
  const address = `/lots/${encodeURIComponent(lot.code)}/holds`;
  const left = lot.summary.size - lot.summary.tested;
  return (
    <HoldPanel
      title="On hold"
      actions={
        <>
          {mayRelease ? (
            <Button kind="filled" onClick={() => setAsking(true)}>
              Release the hold
            </Button>
          ) : null}
          <ButtonLink kind="link" href={address}>
            Suspect boards and holds before
          </ButtonLink>
          {byName === null ? (
            <ButtonLink kind="link" href={`/board-types/${encodeURIComponent(lot.boardTypeCode)}/hold-rules`}>
              The rules
            </ButtonLink>
          ) : null}
        </>
      }
    >
      {/[.!?]$/.test(reason) ? reason : `${reason}.`} Held by {byName ?? 'rule'}, <Time iso={sinceIso} />.{' '}
      {suspects.boards > 0 ? <b>{count(suspects.boards)}</b> : 'No'} {suspects.boards === 1 ? 'board is' : 'boards are'}{' '}
      suspect{suspects.boards > 0 ? ', passed ' : ': none passed '}
      {suspects.since === 'run' ? 'since the run began' : 'since the last good daily check'}.
      <ReasonDialog
        open={asking}
        onClose={() => setAsking(false)}
        title={`Release lot ${lot.code}?`}
        consequence={
          left > 0
            ? `${left} boards have no verdict; benches may test them again. Your reason is recorded.`
            : 'Your reason is recorded.'
        }
        verb="Sign and release"
        keep="Keep it on hold"
        signed
        words={wordsFor('hold-release', reasons)}
        send={(given, password) => actions.release({ lotId: lot.id, reason: given, password })}
        onDone={() => {
          setAsking(false);
          toast(`Lot ${lot.code} is released`);
          onChanged();
        }}
      />
    </HoldPanel>
  );
}

export function LotSheetLink({ code }: { code: string }) {
  return <ButtonLink href={`/lots/${encodeURIComponent(code)}/sheet`}>Lot sheet</ButtonLink>;
}
