'use client';

import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Section } from '@/components/ui/page-head';
import { useToast } from '@/components/ui/toast';
import type { CertificateRow } from '@/lib/contracts/certificate';
import type { Outcome } from '@/lib/contracts/outcome';
import { ReasonDialog } from '../reason-dialog';
import { Time } from '../time';
import { IssueDialog } from './issue-dialog';
import { ValidityMark } from './validity-mark';

/** What a page gives for its board or lot. */
export interface CertificatesGiven {
  rows: readonly CertificateRow[];
  mayIssue: boolean;
  signer: string;
  issue: (input: unknown) => Promise<Outcome<{ id: string; number: string }>>;
  revoke: (input: unknown) => Promise<Outcome>;
}

interface CertificatesSectionProps extends CertificatesGiven {
  subject: { unitId: string } | { lotId: string };
  /** "board 00042" or "lot 2648-B". */
  what: string;
  /** Why none can be issued now. */
  unavailable: string | null;
}

/** Certificates of a board or lot, newest first, and issuing one more. */
export function CertificatesSection(props: CertificatesSectionProps) {
  const { rows, mayIssue, signer, issue, revoke, subject, what, unavailable } = props;
  const toast = useToast();
  const [issuing, setIssuing] = useState(false);
  const [revoking, setRevoking] = useState<CertificateRow | null>(null);
  const counts = rows.find(({ validity }) => validity.kind === 'valid' || validity.kind === 'under-review');
  return (
    <div className="sw-screen-only">
      <Section
        title="Certificates"
        aside={
          mayIssue ? (
            <Button onClick={() => setIssuing(true)} unavailable={unavailable}>
              {rows.length > 0 ? 'Issue it anew' : 'Issue a certificate'}
            </Button>
          ) : null
        }
      >
        {rows.length === 0 ? (
          <EmptyState title="No certificate was issued.">It appears here with its paper, ready to send.</EmptyState>
        ) : (
          <ul>
            {rows.map((row) => (
              <li
                key={row.id}
                className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1 border-b border-hair py-2"
              >
                <a className="sw-link font-num" href={`/api/certificates/${row.id}/pdf`}>
                  {row.number}
                </a>
                <ValidityMark validity={row.validity} />
                <span className="text-ink-2">
                  {row.issuedByName}, <Time iso={row.issuedIso} />
                </span>
                {mayIssue && row.validity.kind !== 'revoked' ? (
                  <Button kind="link" onClick={() => setRevoking(row)} aria-label={`Revoke ${row.number}`}>
                    Revoke
                  </Button>
                ) : null}
              </li>
            ))}
          </ul>
        )}
        <p className="mt-2">
          <Link className="sw-link" href="/certificates">
            All certificates
          </Link>
        </p>
      </Section>
      {issuing ? (
        <IssueDialog
          {...{ subject, what, signer, issue }}
          replaces={counts?.number ?? null}
          onClose={() => setIssuing(false)}
          onIssued={(number) => {
            setIssuing(false);
            toast(`Certificate ${number} is issued`);
          }}
        />
      ) : null}
      {revoking ? (
        <ReasonDialog
          open
          signed
          onClose={() => setRevoking(null)}
          title={`Revoke certificate ${revoking.number}?`}
          consequence="Whoever checks the paper reads at once that it does not count, with the reason you give. It cannot be made valid again; a new one can be issued."
          verb="Sign and revoke"
          keep="Leave it valid"
          send={(reason, password) => revoke({ certificateId: revoking.id, reason, password })}
          onDone={() => {
            toast(`Certificate ${revoking.number} is revoked`);
            setRevoking(null);
          }}
        />
      ) : null}
    </div>
  );
}
