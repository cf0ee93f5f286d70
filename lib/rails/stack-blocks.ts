/** Something to draw inside the rails: where it wants its centre, and the room it takes above and below. Pixels. */
export interface Block {
  key: string;
  wantedY: number;
  above: number;
  below: number;
}

/**
 * Centres that keep the order of the wanted ones and never overlap, each moved as little as possible: overlapping
 * neighbours are merged and placed around their common mean. All stay between `top` and `bottom` while there is room.
 */
export function stackBlocks(blocks: readonly Block[], top: number, bottom: number, gap = 6): Map<string, number> {
  const sorted = [...blocks].sort((a, b) => a.wantedY - b.wantedY);
  const groups: Group[] = [];
  for (const block of sorted) {
    let group = place([block], top, bottom, gap);
    for (let last = groups.at(-1); last && last.start + last.height + gap > group.start; last = groups.at(-1)) {
      groups.pop();
      group = place([...last.members, ...group.members], top, bottom, gap);
    }
    groups.push(group);
  }
  const centres = new Map<string, number>();
  for (const group of groups) {
    let y = group.start;
    for (const block of group.members) {
      centres.set(block.key, y + block.above);
      y += block.above + block.below + gap;
    }
  }
  return centres;
}

interface Group {
  members: Block[];
  start: number;
  height: number;
}

/** Members under each other around the mean of where each would put the group, inside the room. */
function place(members: Block[], top: number, bottom: number, gap: number): Group {
  let height = -gap;
  let sum = 0;
  for (const block of members) {
    height += gap;
    sum += block.wantedY - block.above - height;
    height += block.above + block.below;
  }
  const start = Math.max(top, Math.min(sum / members.length, bottom - height));
  return { members, start, height };
}
