import fc from 'fast-check';
import { expect, test } from 'vitest';
import { frameWords, middleFrame, moveFrame, resizeFrame } from '@/lib/board-type/trimmer-frame';
import { trimmerFrameSchema } from '@/lib/contracts/board-type';

test('however it is moved and sized, a frame stays inside its picture', () => {
  const share = fc.double({ min: -2, max: 2, noNaN: true });
  fc.assert(
    fc.property(fc.array(fc.tuple(fc.boolean(), share, share), { maxLength: 20 }), (moves) => {
      const frame = moves.reduce((at, [sizes, x, y]) => (sizes ? resizeFrame : moveFrame)(at, x, y), middleFrame);
      expect(trimmerFrameSchema.safeParse(frame).success).toBe(true);
      expect(frame.x + frame.width).toBeLessThanOrEqual(1.0001);
      expect(frame.y + frame.height).toBeLessThanOrEqual(1.0001);
    }),
  );
});

test('a frame is told in words', () => {
  expect(frameWords(moveFrame(middleFrame, 0.02, -0.1))).toBe(
    '42 % from the left, 30 % from the top, 20 % wide, 20 % high',
  );
});
