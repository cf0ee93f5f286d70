'use client';

import { CheckField } from '@/components/ui/check-field';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/page-head';
import { layoutLabel } from '@/lib/barcode/label-layout';
import { serialGroups } from '@/lib/barcode/serial-groups';
import { readSerialPattern } from '@/lib/board-type/serial-pattern';
import type { BoardType } from '@/lib/contracts/board-type';
import { LabelDrawing } from '../label-drawing';
import { useBoardTypeForm } from './form-context';

/** Which lines the label has, and the label as it is printed. */
export function LabelSection({ code, limits }: { code: string; limits: BoardType['limits'] }) {
  const { form, readOnly, change } = useBoardTypeForm();
  const pattern = readSerialPattern(form.serialPattern);
  const serial = pattern.ok ? pattern.example : `${code}00001`;
  const middle = ({ min, max }: { min: number; max: number }) => (min + max) / 2;
  const drawn = layoutLabel({
    serial,
    serialGroups: serialGroups(serial, code),
    boardTypeCode: code,
    boardTypeName: form.name,
    tripVolts: middle(limits.tripVolts),
    releaseVolts: middle(limits.releaseVolts),
    lines: form.label,
  });
  const line = (name: keyof typeof form.label, label: string) => (
    <CheckField
      label={label}
      checked={form.label[name]}
      disabled={readOnly}
      onChange={(event) => change({ label: { ...form.label, [name]: event.target.checked } })}
    />
  );
  return (
    <Section title="Label" aside={<span className="text-cap text-ink-2">40 × 20 mm, barcode and serial always</span>}>
      <div className="grid grid-cols-[repeat(auto-fit,minmax(220px,1fr))] items-start gap-6">
        <div>
          {line('typeLine', 'Code and name of the board type')}
          {line('pointsLine', 'Where the board switches off and on')}
        </div>
        {drawn.ok ? (
          <div className="max-w-80 border border-ink bg-[#fff] p-1">
            <LabelDrawing layout={drawn.layout} serial={serial} />
          </div>
        ) : (
          <Notice>{drawn.sentence}</Notice>
        )}
      </div>
    </Section>
  );
}
