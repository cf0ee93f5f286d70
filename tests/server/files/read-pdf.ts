import { PDFiumLibrary } from '@hyzyla/pdfium';
import sharp, { type Sharp } from 'sharp';

export interface ReadPage {
  text: string;
  picture: () => Sharp;
}

/** Every page of a PDF as an independent renderer (PDFium) reads it, its text and at 200 dots an inch its picture. */
export async function readPdf(bytes: Uint8Array): Promise<ReadPage[]> {
  const library = await PDFiumLibrary.init();
  const document = await library.loadDocument(bytes);
  const pages: ReadPage[] = [];
  for (const page of document.pages()) {
    // Text first: rendering lets go of the page. Every move of the pen breaks a line.
    const text = page.getText().replace(/\s+/g, ' ');
    const { data, width, height } = await page.render({ scale: 200 / 72, render: 'bitmap' });
    pages.push({ text, picture: () => sharp(data, { raw: { width, height, channels: 4 } }) });
  }
  library.destroy();
  return pages;
}
