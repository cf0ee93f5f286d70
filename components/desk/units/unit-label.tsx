import { Notice } from '@/components/ui/notice';
import { layoutLabel } from '@/lib/barcode/label-layout';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { UnitPage } from '@/lib/contracts/unit-page';
import { LabelDrawing } from '../label-drawing';
import { Time } from '../time';

/** The label as it is printed, and what became of the newest one. Printing this page prints the label alone. */
export function UnitLabel({ unit }: { unit: UnitPage }) {
  if (!unit.label) return <p className="text-ink-2">A board gets its label when it passes.</p>;
  const drawn = layoutLabel({
    serial: unit.serial,
    serialGroups: serialGroups(unit.serial, unit.boardTypeCode),
    boardTypeCode: unit.boardTypeCode,
    boardTypeName: unit.boardTypeName,
    ...unit.label,
  });
  const newest = unit.labels[0];
  return (
    <div className="grid gap-2">
      {drawn.ok ? (
        <div className="border border-ink bg-[#fff] p-1 print:border-0 print:p-0">
          <LabelDrawing layout={drawn.layout} serial={unit.serial} />
        </div>
      ) : (
        <Notice>{drawn.sentence}</Notice>
      )}
      <div className="sw-screen-only">
        {newest?.state === 'failed' ? (
          <Notice>{newest.problem ?? 'The label was not printed.'} It is tried again.</Notice>
        ) : null}
        {newest?.state === 'waiting' ? (
          <p role="status">
            {newest.printerName ? `Waiting for ${newest.printerName}` : 'Waiting: the station has no label printer.'}
          </p>
        ) : null}
        {newest?.state === 'printed' && newest.printedIso ? (
          <p className="text-ink-2">
            Printed <Time iso={newest.printedIso} format="second" />
            {newest.printerName ? ` at ${newest.printerName}` : ''}
          </p>
        ) : null}
      </div>
    </div>
  );
}
