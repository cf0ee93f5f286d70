'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { useToast } from '@/components/ui/toast';
import { compareBoardTypes } from '@/lib/board-type/compare-board-types';
import type { BoardTypePage } from '@/lib/contracts/board-type-revision';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { ReasonDialog } from '../reason-dialog';
import { ApproveDialog } from './approve-dialog';
import { AskDialog } from './ask-dialog';
import { focusField } from './form-context';
import type { DraftForm } from './use-draft-form';

type Send = (input: unknown) => Promise<Outcome>;
export interface BoardTypeActions {
  begin: (input: unknown) => Promise<Outcome<{ revisionId: string; number: number }>>;
  save: (input: unknown) => Promise<Outcome<{ version: number }>>;
  discard: Send;
  ask: Send;
  takeBack: Send;
  approve: Send;
  sendBack: Send;
}

interface DraftActionsProps {
  page: BoardTypePage;
  signer: string;
  draft: DraftForm;
  misses: readonly string[];
  actions: BoardTypeActions;
}

type Asking = 'approval' | 'approve' | 'send-back' | 'discard';

const silent = 'The server did not answer. Nothing was stored; what you typed is still here. Try again.';

/** The buttons that a revision has in its state, for whoever looks at it. */
export function DraftActions({ page, signer, draft, misses, actions }: DraftActionsProps) {
  const { code, shown, inUse, history } = page;
  const router = useRouter();
  const toast = useToast();
  const [asking, setAsking] = useState<Asking | null>(null);
  const [busy, setBusy] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const revisionId = shown.id;

  async function run<T>(name: string, send: () => Promise<Outcome<T>>, said: string): Promise<T | null> {
    setBusy(name);
    setProblem(null);
    try {
      const outcome = await send();
      if (outcome.ok) toast(said);
      else setProblem(outcome.sentence);
      router.refresh();
      return outcome.ok ? outcome.value : null;
    } catch (error) {
      // A redirect to the sign-in page is Next's own error and must go on.
      if (String((error as { digest?: unknown }).digest ?? '').startsWith('NEXT_')) throw error;
      setProblem(silent);
      return null;
    } finally {
      setBusy(null);
    }
  }

  async function save(): Promise<void> {
    const { boardType, unreadable, version } = draft;
    if (!boardType) {
      const first = Object.keys(unreadable)[0]!;
      const many = Object.keys(unreadable).length;
      setProblem(`${many === 1 ? 'One value' : `${many} values`} cannot be stored yet. What you typed stays here.`);
      return focusField(first);
    }
    const specification = boardType;
    const stored = await run('save', () => actions.save({ revisionId, version, specification }), 'Draft saved');
    if (stored) draft.saved(stored.version);
  }

  const close = () => setAsking(null);
  const finish = (said: string) => () => {
    close();
    toast(said);
    router.refresh();
  };
  const isDraft = shown.status === 'draft';
  const waits = shown.status === 'submitted';
  const before = inUse ?? history.find(({ status }) => status === 'superseded');
  const errors =
    draft.findings.filter(({ severity }) => severity === 'error').length + Object.keys(draft.unreadable).length;
  return (
    <>
      <FormProblem problem={problem} />
      {isDraft && page.mayEdit ? (
        <>
          <Button
            onClick={() => void save()}
            pending={busy === 'save' ? 'Saving' : null}
            unavailable={draft.dirty ? null : 'Nothing to save.'}
          >
            Save the draft
          </Button>
          <Button
            onClick={() => setAsking('approval')}
            unavailable={errors > 0 ? 'Fix the errors first.' : draft.dirty ? 'Save it first.' : null}
          >
            Ask for approval
          </Button>
          <Button kind="link" onClick={() => setAsking('discard')}>
            Discard
          </Button>
        </>
      ) : null}
      {!isDraft && !waits && page.mayEdit ? (
        <Button
          kind="filled"
          pending={busy === 'begin' ? 'Beginning' : null}
          onClick={() => void run('begin', () => actions.begin({ code }), 'Draft begun')}
        >
          Begin a draft
        </Button>
      ) : null}
      {waits && page.mayEdit ? (
        <Button
          pending={busy === 'take-back' ? 'Taking it back' : null}
          onClick={() => void run('take-back', () => actions.takeBack({ revisionId }), 'It is a draft again')}
        >
          Take it back
        </Button>
      ) : null}
      {waits && page.mayApprove ? (
        <>
          <Button kind="filled" onClick={() => setAsking('approve')}>
            Approve…
          </Button>
          <Button onClick={() => setAsking('send-back')}>Send back…</Button>
        </>
      ) : null}
      {asking === 'approval' ? (
        <AskDialog
          revisionId={revisionId}
          version={draft.version}
          number={shown.number}
          misses={misses}
          misfits={page.misfits}
          onClose={close}
          ask={actions.ask}
          onDone={finish('Quality is asked')}
        />
      ) : null}
      {asking === 'approve' ? (
        <ApproveDialog
          revisionId={revisionId}
          version={shown.version}
          number={shown.number}
          signer={signer}
          note={shown.note}
          changes={before ? compareBoardTypes(before.specification, shown.specification) : []}
          misses={misses}
          misfits={page.misfits}
          onClose={close}
          approve={actions.approve}
          onDone={finish('Approved. New lots take it')}
        />
      ) : null}
      <ReasonDialog
        open={asking === 'send-back'}
        onClose={close}
        title={`Send revision ${shown.number} back?`}
        consequence="It is a draft again. The reason is shown to whoever asked."
        verb="Send it back"
        keep="Leave it waiting"
        send={(reason) => actions.sendBack({ revisionId, version: shown.version, reason })}
        onDone={finish('Sent back')}
      />
      <ReasonDialog
        open={asking === 'discard'}
        onClose={close}
        title={`Discard draft ${shown.number}?`}
        consequence="It stays in the history. What is in use does not change."
        verb="Discard the draft"
        keep="Keep the draft"
        send={(reason) => actions.discard({ revisionId, reason })}
        onDone={finish('Draft discarded')}
      />
    </>
  );
}
