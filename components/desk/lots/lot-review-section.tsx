import { Section } from '@/components/ui/page-head';
import type { LotReview } from '@/lib/contracts/lot-review';
import type { LotSectionProps } from './lot-section';

export function LotReviewSection({ review }: LotSectionProps & { review: LotReview }) {
  return <Section title="Every board, in test order">{review.points.serials.length}</Section>;
}
