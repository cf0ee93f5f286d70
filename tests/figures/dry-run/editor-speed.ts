import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { launchChromium } from '../../browser/chromium';
import { atMost, type FigureRow, type FigureTarget } from '../figure';
import { percentile, round } from '../statistics';
import type { EditTimes } from './editor-page';

const root = fileURLToPath(new URL('../../../', import.meta.url)).replace(/\/$/, '');
const frameMs = 16;

/**
 * Rules and prediction of a 40-step draft after one field is edited, in Chromium, as the editor calls them: every field of
 * every step in turn. The first prediction, with nothing remembered, stands beside them.
 */
export async function editorSpeed(
  progress: (line: string) => void,
): Promise<{ rows: FigureRow[]; targets: FigureTarget[] }> {
  const times = await timesInBrowser();
  progress(`editor: ${times.edits.length} edits of a draft of ${times.steps} steps in Chromium`);
  const all = times.edits.map(({ ms }) => ms);
  const kinds = [...new Set(times.edits.map(({ kind }) => kind))];
  const row = (name: string, ms: number[]): FigureRow => ({
    edited: name,
    edits: ms.length,
    'median ms': round(percentile(ms, 0.5), 2),
    'p95 ms': round(percentile(ms, 0.95), 1),
    'most ms': round(Math.max(...ms), 1),
  });
  return {
    rows: [
      row('any field', all),
      ...kinds.map((kind) =>
        row(
          kind,
          times.edits.filter((edit) => edit.kind === kind).map(({ ms }) => ms),
        ),
      ),
      row('first prediction of the draft', [times.firstMs]),
    ],
    targets: [atMost('rules and prediction after an edit, median ms', round(percentile(all, 0.5), 2), frameMs)],
  };
}

async function timesInBrowser(): Promise<EditTimes> {
  const output = await build({
    configFile: false,
    root,
    logLevel: 'error',
    resolve: { alias: { '@': root } },
    define: { 'process.env.NODE_ENV': '"production"' },
    build: {
      write: false,
      lib: { entry: `${root}/tests/figures/dry-run/editor-page.ts`, formats: ['iife'], name: 'editorPage' },
    },
  });
  const bundles = Array.isArray(output) ? output : [output];
  const code = bundles.flatMap((bundle) =>
    'output' in bundle ? bundle.output.flatMap((chunk) => (chunk.type === 'chunk' ? [chunk.code] : [])) : [],
  );
  const browser = await launchChromium();
  try {
    const page = await browser.newPage();
    await page.addScriptTag({ content: code.join('\n') });
    return await page.evaluate(() =>
      (globalThis as unknown as { editorPage: { editEveryField(): EditTimes } }).editorPage.editEveryField(),
    );
  } finally {
    await browser.close();
  }
}
