import type { BoardType } from '@/lib/contracts/board-type';

/** Files of the demo, stored when it starts (server/demo-pictures.ts); their ids stand in the board types from the seed on. */
export const demoPhotoId = '5b1c0a58-2f0e-4f6b-9d0e-1c1210000001';
export const demoDrawingId = '5b1c0a58-2f0e-4f6b-9d0e-1c1210000002';

/** By the board type's code. */
export const demoPictures: Record<string, Pick<BoardType, 'trimmerPhoto' | 'fixtureDrawing'>> = {
  CB1210: {
    trimmerPhoto: { fileId: demoPhotoId, frame: { x: 0.635, y: 0.2, width: 0.155, height: 0.29 } },
    fixtureDrawing: { fileId: demoDrawingId },
  },
};
