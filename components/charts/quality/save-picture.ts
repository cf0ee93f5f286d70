/** A copy of a drawn chart that stands alone: colours and fonts of the page written into it, on a ground of paper. */
export function standaloneSvg(svg: SVGSVGElement): string {
  const copy = svg.cloneNode(true) as SVGSVGElement;
  const style = getComputedStyle(svg);
  copy.querySelectorAll('[data-chosen-mark]').forEach((mark) => mark.remove());
  const number = style.getPropertyValue('--sw-num').trim();
  copy.setAttribute('font-family', style.getPropertyValue('--sw-text').trim() || style.fontFamily);
  copy.removeAttribute('class');
  for (const node of [copy, ...copy.querySelectorAll('*')]) {
    if (node.getAttribute('class')?.includes('font-num')) node.setAttribute('font-family', number);
    node.removeAttribute('class');
    for (const attribute of [...node.attributes])
      if (attribute.value.includes('var('))
        attribute.value = attribute.value.replaceAll(/var\((--[\w-]+)\)/g, (_, name: string) =>
          style.getPropertyValue(name).trim(),
        );
  }
  const ground = document.createElementNS('http://www.w3.org/2000/svg', 'rect');
  ground.setAttribute('width', '100%');
  ground.setAttribute('height', '100%');
  ground.setAttribute('fill', style.getPropertyValue('--sw-paper').trim());
  copy.prepend(ground);
  return new XMLSerializer().serializeToString(copy);
}

/** Fonts do not reach into an image, so the PNG's copy carries them: every face of the page's two families in Latin. */
async function fontFaces(): Promise<string> {
  const rules = [...document.styleSheets].flatMap((sheet) => {
    try {
      return [...sheet.cssRules]
        .filter((rule) => rule instanceof CSSFontFaceRule)
        .map((rule) => ({ rule, base: sheet.href }));
    } catch {
      return [];
    }
  });
  const latin = rules.filter(({ rule }) => /U\+0{0,4}0?-?0*FF/i.test(rule.style.getPropertyValue('unicode-range')));
  const faces = await Promise.all(
    latin.map(async ({ rule, base }) => {
      const address = /url\("?([^")]+)"?\)/.exec(rule.style.getPropertyValue('src'))?.[1];
      if (!address) return '';
      const file = await fetch(new URL(address, base ?? document.baseURI)).then((answer) => answer.blob());
      return rule.cssText.replace(/url\("?[^")]+"?\)/, `url(${await dataAddress(file)})`);
    }),
  );
  return faces.join('\n');
}

function dataAddress(blob: Blob): Promise<string> {
  return new Promise((resolve, reject) => {
    const reader = new FileReader();
    reader.onload = () => resolve(String(reader.result));
    reader.onerror = () => reject(reader.error ?? new Error('unreadable'));
    reader.readAsDataURL(blob);
  });
}

const pixelsAPixel = 2;

/** The chart as PNG at twice its size on the screen. */
export async function pngOf(svg: SVGSVGElement): Promise<Blob> {
  const { width, height } = svg.viewBox.baseVal;
  const faces = await fontFaces().catch(() => '');
  const text = standaloneSvg(svg).replace(/>/, `><style>${faces.replaceAll('<', '')}</style>`);
  const image = new Image();
  image.src = await dataAddress(new Blob([text], { type: 'image/svg+xml' }));
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = width * pixelsAPixel;
  canvas.height = height * pixelsAPixel;
  canvas.getContext('2d')!.drawImage(image, 0, 0, canvas.width, canvas.height);
  return new Promise((resolve, reject) =>
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('the canvas gave no picture'))), 'image/png'),
  );
}

/** Hands a file to the browser's downloads. */
export function download(blob: Blob, fileName: string): void {
  const address = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
