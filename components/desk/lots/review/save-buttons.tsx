'use client';

import type { RefObject } from 'react';
import { download, pngOf, standaloneSvg } from '@/components/charts/quality/save-picture';
import { useToast } from '@/components/ui/toast';

/** The picture of a chart as a file. `name` without an ending; `what` is read aloud. */
export function SaveButtons({ svg, name, what }: { svg: RefObject<SVGSVGElement | null>; name: string; what: string }) {
  const toast = useToast();
  const saveSvg = () => {
    if (svg.current) download(new Blob([standaloneSvg(svg.current)], { type: 'image/svg+xml' }), `${name}.svg`);
  };
  const savePng = () => {
    if (!svg.current) return;
    pngOf(svg.current).then(
      (blob) => download(blob, `${name}.png`),
      () => toast('The browser did not draw the picture. Save it as SVG.'),
    );
  };
  return (
    <span className="sw-screen-only flex gap-3 text-cap whitespace-nowrap">
      <button type="button" className="sw-link" aria-label={`Save ${what} as SVG`} onClick={saveSvg}>
        Save as SVG
      </button>
      <button type="button" className="sw-link" aria-label={`Save ${what} as PNG`} onClick={savePng}>
        PNG
      </button>
    </span>
  );
}
