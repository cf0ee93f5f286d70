import type { TrimmerFrame } from '../contracts/board-type';

const least = 0.02;
const round = (value: number) => Number(value.toFixed(4));
const within = (value: number, low: number, high: number) => round(Math.min(high, Math.max(low, value)));

/** A new photograph's frame: its middle. */
export const middleFrame: TrimmerFrame = { x: 0.4, y: 0.4, width: 0.2, height: 0.2 };

/** Moved by shares of the picture, and kept inside it. */
export function moveFrame(frame: TrimmerFrame, right: number, down: number): TrimmerFrame {
  return {
    ...frame,
    x: within(frame.x + right, 0, 1 - frame.width),
    y: within(frame.y + down, 0, 1 - frame.height),
  };
}

/** Made wider and taller by shares of the picture, its upper left corner where it is. */
export function resizeFrame(frame: TrimmerFrame, wider: number, taller: number): TrimmerFrame {
  return {
    ...frame,
    width: within(frame.width + wider, least, 1 - frame.x),
    height: within(frame.height + taller, least, 1 - frame.y),
  };
}

/** "42 % from the left, 30 % from the top, 12 % wide, 10 % high" */
export function frameWords({ x, y, width, height }: TrimmerFrame): string {
  const percent = (share: number) => `${Math.round(share * 100)} %`;
  return `${percent(x)} from the left, ${percent(y)} from the top, ${percent(width)} wide, ${percent(height)} high`;
}
