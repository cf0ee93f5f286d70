import sharp from 'sharp';
import { mostPixels, mostSidePixels } from '@/lib/files/file-rules';

export interface EncodedPicture {
  bytes: Buffer;
  mediaType: 'image/webp';
  width: number;
  height: number;
}

/**
 * The picture drawn anew: upright as its EXIF says, without metadata, at most 2,400 pixels a side, first frame only. Null where
 * it cannot be decoded; `too-many-pixels` is told from the header, before anything is unpacked.
 */
export async function encodePicture(bytes: Uint8Array): Promise<EncodedPicture | 'too-many-pixels' | null> {
  try {
    const { width, height } = await sharp(bytes, { limitInputPixels: false }).metadata();
    if (width * height > mostPixels) return 'too-many-pixels';
    const { data, info } = await sharp(bytes, { limitInputPixels: mostPixels, failOn: 'error', sequentialRead: true })
      .rotate()
      .resize({ width: mostSidePixels, height: mostSidePixels, fit: 'inside', withoutEnlargement: true })
      .webp({ quality: 84 })
      .timeout({ seconds: 20 })
      .toBuffer({ resolveWithObject: true });
    return { bytes: data, mediaType: 'image/webp', width: info.width, height: info.height };
  } catch {
    return null;
  }
}
