'use client';

import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { Role } from '@/lib/access/roles';
import type { Outcome } from '@/lib/contracts/outcome';
import type { UnitDisposition, UnitPage } from '@/lib/contracts/unit-page';
import { secondSignerProblem, sidesOf } from '@/lib/decision/concession-sides';
import { DecisionRecord } from './decision-record';
import { otherSideWords } from './decision-words';
import { SecondSignatureDialog } from './second-signature-dialog';

export interface DecisionViewer {
  accountId: string;
  name: string;
  roles: readonly Role[];
}

interface UnitDecisionsProps {
  unit: UnitPage;
  viewer: DecisionViewer;
  complete: (input: unknown) => Promise<Outcome>;
  onDone: (said: string) => void;
}

/** Whether a concession can still get its second signature: nothing was decided or tested since. */
const waitsForSecond = (unit: UnitPage, disposition: UnitDisposition) =>
  disposition.kind === 'concession' &&
  disposition.signatures.length === 1 &&
  disposition === unit.dispositions[0] &&
  (unit.standing.kind === 'needs-disposition' || unit.standing.kind === 'attempts-used');

/** What was decided about a board, signature by signature, and the second signature where one is missing. */
export function UnitDecisions({ unit, viewer, complete, onDone }: UnitDecisionsProps) {
  const [signing, setSigning] = useState<UnitDisposition | null>(null);
  if (unit.dispositions.length === 0) return null;
  const viewerSides = sidesOf(viewer.roles);
  return (
    <section className="mb-5">
      <h2 className="mt-4 flex flex-wrap justify-between gap-3 border-t-2 border-ink pt-2.5 font-bold">
        Decisions
        <Link className="sw-link font-normal" href={`/units/${encodeURIComponent(unit.serial)}/decisions`}>
          Print
        </Link>
      </h2>
      {unit.dispositions.map((disposition) => {
        const first = disposition.signatures[0];
        const waits = first !== undefined && waitsForSecond(unit, disposition);
        const may = waits && secondSignerProblem(first, { accountId: viewer.accountId, sides: viewerSides }) === null;
        return (
          <div key={disposition.id} className="border-b border-hair py-2">
            <DecisionRecord disposition={disposition} />
            {waits ? (
              <p className="mt-2 flex items-start gap-1.5 font-bold">
                <VerdictMark shape="check" size={15} />
                Waits for the second signature, by {otherSideWords(first.sides)}.
              </p>
            ) : null}
            {may ? (
              <Button className="mt-2" kind="filled" onClick={() => setSigning(disposition)}>
                Read and sign
              </Button>
            ) : null}
          </div>
        );
      })}
      {signing ? (
        <SecondSignatureDialog
          serial={unit.serial}
          disposition={signing}
          signer={viewer.name}
          complete={complete}
          onClose={() => setSigning(null)}
          onDone={(said) => {
            setSigning(null);
            onDone(said);
          }}
        />
      ) : null}
    </section>
  );
}
