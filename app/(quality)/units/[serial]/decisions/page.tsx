import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { DecisionRecord } from '@/components/desk/decisions/decision-record';
import { PrintButton } from '@/components/desk/print-button';
import { standingWords } from '@/components/desk/words';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Mark } from '@/components/ui/mark';
import { SerialStrip } from '@/components/ui/serial-strip';
import { authorise } from '@/server/auth/authorise';
import { readUnitPage } from '@/server/operations/units/read-unit-page';

interface Props {
  params: Promise<{ serial: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Decisions on board ${decodeURIComponent((await params).serial)}` };
}

/** A page of A4: what was decided about a board, with every signature. */
export default async function UnitDecisionsPage({ params }: Props) {
  await authorise('signed-in');
  const unit = await readUnitPage(decodeURIComponent((await params).serial));
  if (!unit) notFound();
  return (
    <article className="max-w-[760px]">
      <div className="sw-screen-only mb-6 flex flex-wrap gap-4">
        <PrintButton>Print the decisions</PrintButton>
        <ButtonLink kind="link" href={`/units/${encodeURIComponent(unit.serial)}`}>
          Back to the board
        </ButtonLink>
      </div>
      <div className="flex items-start justify-between gap-6 border-b-2 border-ink pb-4">
        <div>
          <p className="text-ink-2">Decisions on board</p>
          <h1 className="text-[34px] leading-tight max-sm:text-[24px]">
            <SerialStrip serial={unit.serial} boardTypeCode={unit.boardTypeCode} />
          </h1>
          <p>
            {unit.boardTypeCode}, {unit.boardTypeName}. Lot {unit.lotCode}. Now: {standingWords[unit.standing.kind]}.
          </p>
        </div>
        <Mark size={56} title="Sillwright" />
      </div>
      {unit.dispositions.length === 0 ? (
        <div className="mt-6">
          <EmptyState title="Nothing was decided about this board." />
        </div>
      ) : (
        unit.dispositions.map((disposition) => (
          <section key={disposition.id} className="border-b border-rule py-4 break-inside-avoid">
            <DecisionRecord disposition={disposition} />
          </section>
        ))
      )}
    </article>
  );
}
