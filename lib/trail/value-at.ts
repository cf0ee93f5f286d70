/** What a field was at a moment, told from its changes, oldest first, and from what it is now. Times are ISO. */
export function valueAt<Value>(
  changes: readonly { atIso: string; before: Record<string, unknown> | null; after: Record<string, unknown> | null }[],
  field: string,
  atIso: string,
  now: Value,
): Value {
  const of = changes.filter(({ before, after }) => field in (after ?? {}) || field in (before ?? {}));
  const last = of.findLast((change) => change.atIso <= atIso);
  if (last) return (last.after?.[field] ?? null) as Value;
  const next = of.find((change) => change.atIso > atIso);
  return next?.before && field in next.before ? (next.before[field] as Value) : now;
}
