const list = /^\(@\s*([\d\s,:]*)\)$/;

/** Channels of a list such as `(@101)` or `(@101,103:104)`; null when it is none. */
export function parseChannelList(text: string): number[] | null {
  const match = list.exec(text.trim());
  if (!match) return null;
  const channels: number[] = [];
  for (const item of match[1]!.split(',')) {
    const ends = item.split(':').map((end) => Number(end.trim() || NaN));
    const first = ends[0]!;
    const last = ends[1] ?? first;
    if (ends.length > 2 || !Number.isInteger(first) || !Number.isInteger(last) || last < first) return null;
    for (let channel = first; channel <= last; channel++) channels.push(channel);
  }
  return channels;
}
