/** The batch of a component in force at a moment: the last that came into use by then. Null before the first. `batches` oldest first. */
export function batchAt(
  batches: readonly { component: string; batch: string; fromAt: Date }[],
  component: string,
  at: Date,
): string | null {
  return batches.findLast((each) => each.component === component && each.fromAt <= at)?.batch ?? null;
}
