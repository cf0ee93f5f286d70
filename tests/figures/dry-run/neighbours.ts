import type { FigureRow, FigureTarget } from '../figure';
import { editorSpeed } from './editor-speed';
import { predictionDuration } from './prediction-duration';

/** What the prediction's own measurements add to this figure: its times on the clock on the wall, and the editor's in a browser. */
export async function predictionRows(
  progress: (line: string) => void,
  share: number,
): Promise<{ rows: FigureRow[]; targets: FigureTarget[] }> {
  const duration = await predictionDuration(progress, share);
  const speed = await editorSpeed(progress);
  return {
    rows: [
      ...duration.rows.map(({ sequence, ...row }) => ({ what: `time of ${sequence}`, ...row }) as FigureRow),
      ...speed.rows.map(({ edited, ...row }) => ({ what: `editor: ${edited}`, ...row }) as FigureRow),
    ],
    targets: [...duration.targets, ...speed.targets],
  };
}
