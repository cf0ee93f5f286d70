import { printCode } from '@/lib/bench/scan-code';
import { encodeCode128, widthInModules } from '@/lib/barcode/code128';
import { barPath } from '@/lib/barcode/bar-path';

/** The red bin with the label to scan; the board goes in. The bars are the bin's own code. */
export function BinPicture({ code, label }: { code: string; label: string }) {
  const bars = encodeCode128(printCode('bin', code));
  const barWidth = bars ? 190 / widthInModules(bars) : 1;
  return (
    <svg viewBox="0 0 400 360" aria-hidden="true" className="h-auto w-100 flex-none self-end max-[900px]:w-60">
      <g fill="none" stroke="var(--sw-on-flood)" strokeWidth={6}>
        <path d="M145 4h108v54H145z" fill="var(--sw-on-flood)" />
        <path d="M199 64v50m-24-20 24 22 24-22" />
        <path d="M14 136 46 352H354L386 136" strokeWidth={7} />
        <path d="M0 130H400" strokeWidth={14} />
      </g>
      <path d="M156 16h60v8h-60zM156 32h44v8h-44z" fill="var(--sw-reject-flood)" />
      <circle cx={233} cy={40} r={10} fill="var(--sw-reject-flood)" />
      <rect x={95} y={196} width={210} height={104} fill="#fff" />
      {bars && <path d={barPath(bars, { x: 105, y: 210, module: barWidth, height: 54 })} fill="#17191e" />}
      <text x={200} y={290} textAnchor="middle" className="font-num" fontWeight={700} fontSize={23} fill="#17191e">
        {label}
      </text>
    </svg>
  );
}
