import { Mark } from '@/components/ui/mark';
import { barPath } from '@/lib/barcode/bar-path';
import { encodeCode128, widthInModules } from '@/lib/barcode/code128';

interface BarcodeCardProps {
  /** Set large, such as a name. */
  title: string;
  /** Under it, such as a number. */
  lines: readonly string[];
  /** The text in the barcode, printable ASCII. */
  code: string;
}

const barsMm = { height: 17, widest: 76 };

/** A badge or a bin's card, 86 x 54 mm, with its Code 128. Always black on white. */
export function BarcodeCard({ title, lines, code }: BarcodeCardProps) {
  const barcode = encodeCode128(code);
  if (!barcode) return null;
  const modules = widthInModules(barcode);
  const moduleMm = Math.min(0.5, barsMm.widest / modules);
  const width = modules * moduleMm;
  return (
    <article className="flex h-[54mm] w-[86mm] flex-col justify-between border border-[#000] bg-[#fff] p-[4mm] text-[#000]">
      <header className="flex items-start justify-between gap-3">
        <div className="leading-tight">
          <p className="text-[19px] font-bold">{title}</p>
          {lines.map((line) => (
            <p key={line} className="text-[13px]">
              {line}
            </p>
          ))}
        </div>
        <Mark size={26} />
      </header>
      <figure className="text-center">
        <svg
          viewBox={`0 0 ${width} ${barsMm.height}`}
          style={{ width: `${width}mm`, height: `${barsMm.height}mm` }}
          role="img"
          aria-label={`Barcode ${code}`}
          className="mx-auto block"
        >
          <path
            d={barPath(barcode, { x: 0, y: 0, module: moduleMm, height: barsMm.height })}
            shapeRendering="crispEdges"
          />
        </svg>
        <figcaption className="mt-1 font-num text-[13px]">{code}</figcaption>
      </figure>
    </article>
  );
}
