/** Geometry of the trim dial on a square of 600; angles in turns from 12 o'clock, positive the way the screw turns. */

export interface DialShape {
  /** Radius of the bezel. */
  bezel: number;
  screw: number;
  /** Outline of the thickening arrow. */
  arrow: string;
  /** Whole turns, numbered where they cross 12 o'clock. */
  counters: { turn: number; x: number; y: number; radius: number }[];
  /** Triangle on the bezel at the end's fraction. */
  index: string;
  /** Rotation of the dashed slot, degrees; null where it would cover the present slot. */
  endSlotDegrees: number | null;
}

export type Sense = 1 | -1;

const centre = 300;

export function polar(turns: number, radius: number, sense: Sense): { x: number; y: number } {
  const angle = -Math.PI / 2 + sense * 2 * Math.PI * turns;
  return { x: centre + radius * Math.cos(angle), y: centre + radius * Math.sin(angle) };
}

const text = ({ x, y }: { x: number; y: number }) => `${x.toFixed(2)} ${y.toFixed(2)}`;

/** Shape for `turns` still to make. Below a quarter turn the screw grows and the arc lies just outside it. */
export function dialShape(turns: number, sense: Sense, labelled: boolean): DialShape {
  const bezel = labelled ? 258 : 284;
  const fraction = turns - Math.floor(turns + 1e-9);
  const whole = Math.floor(turns + 1e-9);
  const many = turns > 2;
  const small = turns <= 0.25;
  const screw = many ? 46 : small ? 108 : 72;
  const inner = many ? 74 : small ? 156 : 104;
  const pitch = small ? 0 : Math.min(64, (bezel - (many ? 38 : 50) - inner) / Math.max(turns, 1.2));
  const thick = many ? pitch * 0.6 : 46;
  const thin = many ? pitch * 0.34 : small ? 46 : 18;
  const room = bezel - inner - pitch * turns - 2;
  const headWidth = Math.min(many ? pitch * 0.72 : thick * 1.08, room);
  return {
    bezel,
    screw,
    arrow: arrowOutline({ turns, sense, inner, pitch, thin, thick, headWidth }),
    counters: wholeTurns(whole, fraction, inner, pitch, many ? pitch * 0.44 : 25, sense),
    index: `M${text(polar(turns, bezel - 34, sense))}L${text(polar(turns + 0.017, bezel, sense))}L${text(polar(turns - 0.017, bezel, sense))}Z`,
    endSlotDegrees: fraction > 0.01 && Math.abs(fraction - 0.5) > 0.01 ? fraction * 360 * sense : null,
  };
}

interface Arrow {
  turns: number;
  sense: Sense;
  inner: number;
  pitch: number;
  thin: number;
  thick: number;
  headWidth: number;
}

function arrowOutline({ turns, sense, inner, pitch, thin, thick, headWidth }: Arrow): string {
  const endRadius = inner + pitch * turns;
  const headLength = Math.min(70, turns * 2 * Math.PI * endRadius * 0.45);
  const headTurns = headLength / (2 * Math.PI * endRadius);
  const bodyTurns = turns - headTurns;
  const outer: string[] = [];
  const innerEdge: string[] = [];
  const steps = Math.ceil(turns * 90) + 8;
  for (let i = 0; i <= steps; i++) {
    const at = (bodyTurns * i) / steps;
    const half = (thin + (thick - thin) * (i / steps)) / 2;
    outer.push(text(polar(at, inner + pitch * at + half, sense)));
    innerEdge.push(text(polar(at, inner + pitch * at - half, sense)));
  }
  const headOuter: string[] = [];
  const headInner: string[] = [];
  for (let i = 0; i < 6; i++) {
    const at = bodyTurns + (headTurns * i) / 6;
    const half = headWidth * (1 - i / 6);
    headOuter.push(text(polar(at, inner + pitch * at + half, sense)));
    headInner.push(text(polar(at, inner + pitch * at - half, sense)));
  }
  const tip = text(polar(turns, endRadius, sense));
  return `M${[...outer, ...headOuter, tip, ...headInner.reverse(), ...innerEdge.reverse()].join('L')}Z`;
}

function wholeTurns(whole: number, fraction: number, inner: number, pitch: number, radius: number, sense: Sense) {
  const last = fraction < 0.06 ? whole - 1 : whole;
  return Array.from({ length: Math.max(0, last) }, (_, i) => ({
    turn: i + 1,
    radius,
    ...polar(i + 1, inner + pitch * (i + 1), sense),
  }));
}
