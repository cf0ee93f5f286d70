import type { RailsView } from '@/lib/contracts/bench-view';
import { hysteresisEnds, nothingInside, placeInside, type PlacedFlag } from '@/lib/rails/inside-blocks';
import { heightOf, railsBox, scaleTicks, tubeEdge, tubePaths } from '@/lib/rails/rails-geometry';
import { inks, type Paper } from './paper';

const { tripX, releaseX, topY, bottomY, radius, tube, jawLength, jawHeight } = railsBox;
const middle = (tripX + releaseX) / 2;
const tickLengths = { minor: 15, middle: 23, major: 36 } as const;
type Side = 'trip' | 'release';
const washOf = { trip: inks.tripWash, release: inks.releaseWash };

export interface PrintedPoints {
  trip: string;
  release: string;
  hysteresis: string;
  limits: Record<Side, { min: string; max: string }>;
}

/** The rails of the bench on paper, as vectors: `scale` points a pixel of the bench drawing, its top left at `x`, `y`. */
export function drawRails(paper: Paper, rails: RailsView, points: PrintedPoints, x: number, y: number, scale: number) {
  const { pdf } = paper;
  pdf.save().translate(x, y).scale(scale);
  heads(paper);
  tubes(paper, rails);
  for (const side of ['trip', 'release'] as const) printed(paper, rails, points, side);
  const placed = placeInside(rails, nothingInside);
  hysteresis(paper, rails, placed.flags, placed.hysteresisY, points.hysteresis);
  for (const flag of placed.flags) flagOf(paper, flag, points[flag.flag.side]);
  pdf.restore();
}

function heads(paper: Paper): void {
  paper.pdf.path('M114 33h32l-16 24z').fill(inks.trip);
  paper.line('Trip', 156, 58, { face: 'bold', size: 40, ink: 'trip' });
  paper.line('falling', 156, 95, { size: 29, ink: 'ink2' });
  paper.pdf.path('M451 57h32l-16-24z').fill(inks.release);
  paper.line('Release', 491, 58, { face: 'bold', size: 40, ink: 'release' });
  paper.line('rising', 491, 95, { size: 29, ink: 'ink2' });
}

/** Solid where the load was on, hollow where it was off. */
function tubes({ pdf }: Paper, rails: RailsView): void {
  const tripY = heightOf(rails, rails.travelled.fallingOnToVolts!);
  const releaseY = heightOf(rails, rails.travelled.risingOffToVolts!);
  const solid = (path: string, colour: string) =>
    pdf
      .path(path)
      .lineWidth(tube + 2)
      .stroke(colour);
  const hollow = (path: string, colour: string) => {
    solid(path, colour);
    pdf
      .path(path)
      .lineWidth(tube * 0.66)
      .stroke(inks.white);
  };
  hollow(tubePaths.bottom, inks.ink2);
  solid(tubePaths.top, inks.ink2);
  solid(tubePaths.straight('trip', topY, tripY), inks.trip);
  hollow(tubePaths.straight('trip', tripY, bottomY), inks.trip);
  hollow(tubePaths.straight('release', bottomY, releaseY), inks.release);
  solid(tubePaths.straight('release', releaseY, topY), inks.release);
  pdf.lineWidth(3.4);
  for (let at = topY + 28; at < bottomY; at += 68.5) {
    if (Math.abs(at - tripY) > 16)
      pdf.path(`M${tripX - 7} ${at - 4}l7 8 7-8`).stroke(at < tripY ? inks.white : inks.trip);
    if (Math.abs(at - releaseY) > 16)
      pdf.path(`M${releaseX - 7} ${at + 4}l7-8 7 8`).stroke(at > releaseY ? inks.release : inks.white);
  }
  pdf.path(`M${middle + 4} ${topY - radius - 7}l-8 7 8 7`).stroke(inks.white);
  pdf.path(`M${middle - 4} ${bottomY + radius - 7}l8 7-8 7`).stroke(inks.ink2);
}

/** Outside a tube: scale, limits and their jaws. */
function printed(paper: Paper, rails: RailsView, points: PrintedPoints, side: Side): void {
  const { pdf } = paper;
  const out = side === 'trip' ? -1 : 1;
  const anchor = side === 'trip' ? 'end' : 'start';
  const base = (side === 'trip' ? tripX : releaseX) + out * (tubeEdge + 5);
  const limits = side === 'trip' ? rails.tripLimits! : rails.releaseLimits!;
  const [top, bottom] = [heightOf(rails, limits.max), heightOf(rails, limits.min)];
  const jawEnd = base + out * jawLength;
  const textX = jawEnd + out * 8;
  pdf.rect(Math.min(base, jawEnd), top, jawLength, bottom - top).fill(washOf[side]);
  for (const { volts, rank } of scaleTicks(rails.scaleMinVolts, rails.scaleMaxVolts)) {
    const at = heightOf(rails, volts);
    pdf
      .path(`M${base} ${at}h${out * tickLengths[rank]}`)
      .lineWidth(rank === 'major' ? 2.5 : 1.6)
      .stroke(rank === 'minor' ? inks.rule : inks.ink2);
    const taken = [top - 12, bottom + 14].some((other) => Math.abs(other - at) < 31);
    if (rank === 'major' && !taken)
      paper.line(String(Number(volts.toFixed(2))), textX, at + 10, { face: 'num', size: 29, ink: 'ink2', anchor });
  }
  const jaws = `M${base - out * 3} ${top}H${jawEnd}v${-jawHeight}ZM${base - out * 3} ${bottom}H${jawEnd}v${jawHeight}Z`;
  pdf.path(jaws).fill(inks[side]);
  const number = { face: 'num-bold', size: 31, ink: side, anchor } as const;
  paper.line(points.limits[side].max, textX, top - 2, number);
  paper.line(points.limits[side].min, textX, bottom + 24, number);
}

/** The measured value, its point on the tube. */
function flagOf(paper: Paper, { flag, pointY, boxY, height }: PlacedFlag, label: string): void {
  const { pdf } = paper;
  const inward = flag.side === 'trip' ? 1 : -1;
  const edge = (flag.side === 'trip' ? tripX : releaseX) + inward * tubeEdge;
  const near = edge + inward * 24;
  // More digits are set smaller, so that the flag stays between the tubes.
  const size = Math.min(46, 140 / (0.6 * label.length));
  const far = near + inward * (size * 0.6 * label.length + 26);
  const [top, bottom] = [boxY - height / 2, boxY + height / 2];
  const join = (dy: number) => Math.min(bottom - 6, Math.max(top + 6, pointY + dy));
  pdf
    .path(`M${edge + inward * 4} ${pointY}L${near} ${join(-13)}V${top}H${far}V${bottom}H${near}V${join(13)}Z`)
    .fill(inks[flag.side]);
  pdf
    .path(`M${edge + inward * 2} ${pointY}h${-inward * (tube + 8)}`)
    .lineWidth(4.5)
    .stroke(inks.ink);
  paper.line(label, (near + far) / 2, boxY + size * 0.34, { face: 'num-bold', size, ink: 'white', anchor: 'middle' });
}

function hysteresis(paper: Paper, rails: RailsView, flags: PlacedFlag[], y: number | null, label: string): void {
  const ends = hysteresisEnds(rails.flags);
  if (y === null || !ends) return;
  const of = (side: Side) => flags.find(({ flag }) => flag.side === side)!;
  const top = of('release').boxY + of('release').height / 2 + 4;
  const bottom = of('trip').boxY - of('trip').height / 2 - 4;
  const { pdf } = paper;
  pdf.lineWidth(2);
  if (y - 34 - top > 16) {
    pdf.path(`M${middle} ${top}V${y - 33}`).stroke(inks.ink);
    pdf.path(`M${middle - 7} ${top + 15}L${middle} ${top}l7 15z`).fill(inks.ink);
  }
  if (bottom - y - 34 > 16) {
    pdf.path(`M${middle} ${y + 36}V${bottom}`).stroke(inks.ink);
    pdf.path(`M${middle - 7} ${bottom - 15}L${middle} ${bottom}l7-15z`).fill(inks.ink);
  }
  paper.line('hysteresis', middle, y - 8, { size: 26, ink: 'ink2', anchor: 'middle' });
  paper.line(label, middle, y + 24, { face: 'num-bold', size: 33, anchor: 'middle' });
}
