'use client';

import { useState } from 'react';
import { createReadingStore } from '@/components/bench/live/reading-store';
import { Rails } from '@/components/bench/rails/rails';
import { English } from '@/components/desk/english';
import { railsOfBoard } from '@/lib/certificate/rails-of-board';
import type { CertifiedBoard } from '@/lib/contracts/certificate';

/** The rails as they are printed, to compare by eye. */
export function VerifiedRails({ board }: { board: Pick<CertifiedBoard, 'values'> }) {
  const [readings] = useState(createReadingStore);
  const rails = railsOfBoard(board);
  if (!rails) return null;
  return (
    <div className="mx-auto max-w-[420px]">
      <English>
        <Rails rails={rails} readings={readings} />
      </English>
    </div>
  );
}
