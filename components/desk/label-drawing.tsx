import type { LabelLayout } from '@/lib/barcode/label-layout';

const mmPerPoint = 25.4 / 72;
const families = { text: 'var(--sw-text)', 'num-bold': 'var(--sw-num)' };

/**
 * The label as it is printed: always black on white. On paper the page of a label has 1 mm margins, so only what lies
 * inside them is drawn there (`@page label`).
 */
export function LabelDrawing({ layout, serial }: { layout: LabelLayout; serial: string }) {
  return (
    <svg
      className="sw-label block w-full bg-white print:h-[18mm] print:w-[38mm]"
      viewBox={`1 1 ${layout.widthMm - 2} ${layout.heightMm - 2}`}
      xmlns="http://www.w3.org/2000/svg"
      role="img"
      aria-label={`Label of ${serial} with barcode`}
    >
      <rect width={layout.widthMm} height={layout.heightMm} fill="#fff" />
      <path d={layout.barcode.path} fill="#000" shapeRendering="crispEdges" />
      <path d={layout.mark.path} fill="none" stroke="#000" strokeWidth={layout.mark.strokeMm} />
      {layout.texts.map((line) => (
        <text
          key={line.yMm}
          x={line.xMm}
          y={line.yMm}
          fontSize={line.sizePt * mmPerPoint}
          fontFamily={families[line.font]}
          fontWeight={line.font === 'num-bold' ? 700 : 400}
          textAnchor={line.anchor}
          fill="#000"
        >
          {line.text}
        </text>
      ))}
    </svg>
  );
}
