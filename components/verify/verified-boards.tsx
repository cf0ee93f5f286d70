'use client';

import { useState } from 'react';
import { Table, Td, Th } from '@/components/ui/table';
import { TextField } from '@/components/ui/text-field';
import { valueText } from '@/lib/certificate/value-text';
import type { CertifiedValue } from '@/lib/contracts/certificate';

const shown = 40;

interface ListedBoard {
  serial: string;
  values: readonly CertifiedValue[];
  conceded: boolean;
}

/** Boards that a lot's certificate lists; one is found by its last digits. */
export function VerifiedBoards({ boards }: { boards: readonly ListedBoard[] }) {
  const [find, setFind] = useState('');
  const found = boards.filter(({ serial }) => serial.includes(find.trim().toUpperCase()));
  const text = ({ values }: ListedBoard, quantity: CertifiedValue['quantity']) => {
    const value = values.find((each) => each.quantity === quantity);
    return value ? valueText(value).value : '–';
  };
  return (
    <div className="mt-5 border-t-2 border-ink pt-3">
      <TextField
        label="Find a board by its serial number"
        mono
        inputMode="numeric"
        value={find}
        onChange={(event) => setFind(event.target.value)}
      />
      <p role="status" className="my-2 text-ink-2">
        {found.length === 0
          ? 'This certificate covers no such board.'
          : `${found.length} of ${boards.length} boards${found.length > shown ? `, the first ${shown} shown` : ''}`}
      </p>
      {found.length > 0 ? (
        <Table stacks={false} aria-label="Boards of this certificate">
          <thead>
            <tr>
              <Th>Serial</Th>
              <Th number>
                <span className="font-text">Trip, V</span>
              </Th>
              <Th number>
                <span className="font-text">Release, V</span>
              </Th>
            </tr>
          </thead>
          <tbody>
            {found.slice(0, shown).map((board) => (
              <tr key={board.serial}>
                <Td className="font-num">
                  {board.serial}
                  {board.conceded ? <span className="block font-text text-cap">by concession</span> : null}
                </Td>
                <Td number>{text(board, 'trip-volts')}</Td>
                <Td number>{text(board, 'release-volts')}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      ) : null}
    </div>
  );
}
