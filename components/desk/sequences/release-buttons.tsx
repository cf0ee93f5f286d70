'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import type { ComparisonPage } from '@/lib/contracts/sequence-pages';
import { ReasonDialog } from '../reason-dialog';
import { ReleaseDialog } from './release-dialog';

interface ReleaseButtonsProps {
  page: Pick<ComparisonPage, 'b' | 'heads' | 'mayRelease' | 'mayTakeBack'>;
  signer: string;
  release: (input: unknown) => Promise<Outcome>;
  sendBack: (input: unknown) => Promise<Outcome>;
}

/** Send back, or sign and release, for whoever may; a writer can only take it back. */
export function ReleaseButtons({ page, signer, release, sendBack }: ReleaseButtonsProps) {
  const router = useRouter();
  const toast = useToast();
  const [asking, setAsking] = useState<'release' | 'send-back' | null>(null);
  const { b, heads, mayRelease, mayTakeBack } = page;
  const { id: revisionId, number, submittedBy } = b.head;
  const inUse = heads.find(({ status }) => status === 'released')?.number ?? null;
  const done = (said: string) => {
    setAsking(null);
    toast(said);
    router.refresh();
  };
  if (!mayRelease && !mayTakeBack) return null;
  return (
    <>
      <Button onClick={() => setAsking('send-back')}>
        {mayRelease ? 'Send back with a reason…' : 'Take back with a reason…'}
      </Button>
      {mayRelease ? (
        <Button kind="filled" onClick={() => setAsking('release')}>
          Sign and release r{number}…
        </Button>
      ) : null}
      <ReasonDialog
        open={asking === 'send-back'}
        onClose={() => setAsking(null)}
        title={mayRelease ? `Send r${number} back?` : `Take r${number} back?`}
        consequence={
          mayRelease
            ? `It becomes a draft again. ${submittedBy ?? 'Its writer'} sees your reason in it.`
            : 'It becomes a draft again, to be submitted once more.'
        }
        verb={mayRelease ? 'Send it back' : 'Take it back'}
        keep="Leave it"
        send={(reason) => sendBack({ revisionId, reason })}
        onDone={() => done(`r${number} is a draft again`)}
      />
      {asking === 'release' ? (
        <ReleaseDialog
          head={b.head}
          inUse={inUse}
          signer={signer}
          onClose={() => setAsking(null)}
          onDone={() => done(`r${number} is released. New lots take it`)}
          release={release}
        />
      ) : null}
    </>
  );
}
