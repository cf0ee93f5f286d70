import type { BoardKind } from './board-kinds';
import { boardsAStroke, dotsPath, linePath, type LinePoint } from './thin-line';

export interface DrawnBoard extends LinePoint {
  place: number;
  kind: BoardKind;
}

interface BoardLayerProps {
  /** In test order, within the axis. */
  boards: readonly DrawnBoard[];
  /** Width of the plot. */
  pixels: number;
}

const triangle = ({ x, y }: LinePoint) => `M${x.toFixed(1)} ${(y - 6.5).toFixed(1)}l6.5 11.5h-13z`;
const square = ({ x, y }: LinePoint) => `M${(x - 4.5).toFixed(1)} ${(y - 4.5).toFixed(1)}h9v9h-9z`;

/** The line of the boards and their marks: dots, amber circles of runs, amber triangles beyond control limits, red squares. */
export function BoardLayer({ boards, pixels }: BoardLayerProps) {
  const each = boardsAStroke(boards.length, pixels);
  const of = (kind: BoardKind) => boards.filter((board) => board.kind === kind);
  const dot = pixels / Math.max(boards.length, 1) > 3 ? 4.4 : 3;
  return (
    <g fill="none">
      <path d={linePath(boards, each)} stroke="var(--sw-rule)" strokeLinejoin="round" />
      {each === 1 ? (
        <path d={dotsPath(of('plain'))} stroke="var(--sw-ink)" strokeWidth={dot} strokeLinecap="round" />
      ) : null}
      <path d={dotsPath(of('run'))} stroke="var(--sw-on-attn)" strokeWidth={9.4} strokeLinecap="round" />
      <path d={dotsPath(of('run'))} stroke="var(--sw-attn)" strokeWidth={6} strokeLinecap="round" />
      <path
        d={of('beyond').map(triangle).join('')}
        fill="var(--sw-attn)"
        stroke="var(--sw-on-attn)"
        strokeWidth={1.6}
        strokeLinejoin="round"
      />
      <path d={of('rejected').map(square).join('')} fill="var(--sw-reject)" />
    </g>
  );
}
