import Link from 'next/link';
import { movingRangeOf } from '@/components/charts/quality/moving-range-of';
import { quantityLooks, valueText } from '@/components/charts/quality/quantity-look';
import { SerialStrip } from '@/components/ui/serial-strip';
import type { LotReview } from '@/lib/contracts/lot-review';
import { stretchWords } from '@/lib/quality/run-words';
import { Time } from '../../time';

const markWords: Record<string, string> = { P: 'passed', W: 'passed on a later attempt', R: 'rejected' };

/** One board in a line of words, for the slider's value. */
export function boardWords(review: LotReview, place: number): string {
  const { points, quantity } = review;
  const value = points.values[place];
  const measured = value == null ? 'not measured' : `${valueText(quantity, value)} ${quantityLooks[quantity].unit}`;
  return `Board ${place + 1} of ${points.serials.length}, ${points.serials[place]}, ${measured}, ${markWords[points.marks[place]!] ?? ''}`;
}

interface BoardReadoutProps {
  review: LotReview;
  boardTypeCode: string;
  /** Null: no board is chosen. */
  place: number | null;
}

/** What the chart knows of the chosen board. */
export function BoardReadout({ review, boardTypeCode, place }: BoardReadoutProps) {
  if (place === null)
    return <p className="min-h-[52px] text-ink-2 sm:min-h-[28px]">Arrow keys or a pointer walk over the boards.</p>;
  const { points, quantity, stretches, stationCodes } = review;
  const { unit } = quantityLooks[quantity];
  const value = points.values[place];
  const found = points.found[place];
  const range = movingRangeOf(points.values)[place];
  const told = stretches.filter(({ from, to }) => place + 1 >= from && place + 1 <= to);
  return (
    <p className="min-h-[52px] sm:min-h-[28px]">
      Board <b>{place + 1}</b>,{' '}
      <Link className="sw-link" href={`/units/${encodeURIComponent(points.serials[place]!)}`}>
        <SerialStrip serial={points.serials[place]!} boardTypeCode={boardTypeCode} />
      </Link>
      :{' '}
      {value == null ? (
        'not measured'
      ) : (
        <>
          <b className="font-num">{valueText(quantity, value)}</b> {unit}
        </>
      )}
      {range == null ? '' : `, range ${valueText(quantity, range)}`}
      {found == null ? '' : `, found at ${valueText(quantity, found)}`}, station {stationCodes[points.station[place]!]},{' '}
      <Time iso={new Date(points.endedAt[place]! * 1000).toISOString()} />, {markWords[points.marks[place]!]}.
      {told.map((stretch) => (
        <span key={`${stretch.rule} ${stretch.from}`} className="text-ink-2">
          {' '}
          Rule {stretch.rule}, {stretchWords(stretch).replace(/^B/, 'b')}.
        </span>
      ))}
    </p>
  );
}
