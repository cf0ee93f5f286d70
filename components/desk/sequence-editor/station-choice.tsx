'use client';

import { FillInChoice } from '@/components/ui/fill-in';
import type { DraftPage } from '@/lib/contracts/sequence-draft';

interface StationChoiceProps {
  stations: DraftPage['stations'];
  /** Null: the usual one. */
  chosen: string | null;
  onChoose: (code: string | null) => void;
}

/** The station for which the draft is checked and predicted. */
export function StationChoice({ stations, chosen, onChoose }: StationChoiceProps) {
  return (
    <span className="inline-flex flex-wrap items-baseline gap-2">
      checked and drawn for one typical board at
      <FillInChoice
        label="Station"
        value={chosen ?? ''}
        onChange={({ target }) => onChoose(target.value || null)}
        choices={[
          { value: '', label: 'the usual station' },
          ...stations.map(({ code, name }) => ({ value: code, label: name })),
        ]}
      />
    </span>
  );
}
