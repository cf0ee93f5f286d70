import { barPath } from '@/lib/barcode/bar-path';
import { encodeCode128, widthInModules } from '@/lib/barcode/code128';
import { printCode } from '@/lib/bench/scan-code';

/** Millimetres; wide bars, since a sheet is scanned from an arm's length. */
const moduleMm = 0.4;
const height = 18;

/** The barcode of a lot, with our own prefix, as Code 128. Always black on white. */
export function LotBarcode({ code }: { code: string }) {
  const text = printCode('lot', code);
  const barcode = encodeCode128(text);
  if (!barcode) return null;
  const width = widthInModules(barcode) * moduleMm;
  return (
    <figure className="inline-block bg-[#fff] p-2 text-[#000]">
      <svg
        viewBox={`0 0 ${width} ${height}`}
        style={{ width: `${width}mm`, height: `${height}mm` }}
        role="img"
        aria-label={`Barcode of lot ${code}`}
        className="max-w-full"
      >
        <path d={barPath(barcode, { x: 0, y: 0, module: moduleMm, height })} shapeRendering="crispEdges" />
      </svg>
      <figcaption className="text-center font-num font-bold">{text}</figcaption>
    </figure>
  );
}
