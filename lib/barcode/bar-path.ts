import { quietModules, type Code128 } from './code128';

export interface BarBox {
  /** Left edge of the left quiet zone. */
  x: number;
  y: number;
  /** Width of one module, in the unit of `x`. */
  module: number;
  height: number;
}

const short = (value: number) => String(Number(value.toFixed(4)));

/** One SVG path, a closed rectangle a bar, the same on screen, in print and in a PDF. Any unit. */
export function barPath(code: Code128, box: BarBox): string {
  let path = '';
  for (const bar of code.bits.matchAll(/1+/g)) {
    const x = box.x + (quietModules + bar.index) * box.module;
    const width = bar[0].length * box.module;
    path += `M${short(x)} ${short(box.y)}h${short(width)}v${short(box.height)}h${short(-width)}z`;
  }
  return path;
}
