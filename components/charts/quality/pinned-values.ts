export interface PinnedValue {
  place: number;
  value: number;
  edge: 'low' | 'high';
  x: number;
  /** Null: another number stands too close; the table has it. */
  text: string | null;
}

const textRoom = 62;

/** Numbers of values beyond the axis, left to right, without covering each other. `width`: where the plot ends. */
export function placePinned(
  pinned: readonly Omit<PinnedValue, 'text'>[],
  text: (value: number) => string,
): PinnedValue[] {
  const last = { low: -Infinity, high: -Infinity };
  return pinned.map((each) => {
    if (each.x - last[each.edge] < textRoom) return { ...each, text: null };
    last[each.edge] = each.x;
    return { ...each, text: text(each.value) };
  });
}
