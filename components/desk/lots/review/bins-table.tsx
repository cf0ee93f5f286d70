import { quantityLooks, valueText } from '@/components/charts/quality/quantity-look';
import { Table, Td, Th } from '@/components/ui/table';
import type { LotReview } from '@/lib/contracts/lot-review';

/** The histogram as counts. */
export function BinsTable({ review }: { review: LotReview }) {
  const { name, unit } = quantityLooks[review.quantity];
  const text = (value: number) => valueText(review.quantity, value);
  const filled = review.bins.filter((bin) => bin.boards > 0);
  return (
    <Table aria-label={`Histogram of ${name.toLowerCase()}`} stacks={false}>
      <thead>
        <tr>
          <Th number>From, {unit}</Th>
          <Th number>To, {unit}</Th>
          <Th number>Boards</Th>
        </tr>
      </thead>
      <tbody>
        {filled.map((bin) => (
          <tr key={bin.from}>
            <Td number>{text(bin.from)}</Td>
            <Td number>{text(bin.to)}</Td>
            <Td number>{bin.boards}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
