/**
 * Of the ids in both lists, the most that stand in the same order in both: a longest increasing subsequence of their places. The
 * others were moved. Ids are unique in each list.
 */
export function keptOrder(before: readonly string[], after: readonly string[]): Set<string> {
  const placeOf = new Map(before.map((id, place) => [id, place]));
  const common = after.filter((id) => placeOf.has(id));
  const places = common.map((id) => placeOf.get(id)!);
  const longest: number[] = [];
  const previous: number[] = [];
  places.forEach((place, i) => {
    let [most, from] = [1, -1];
    for (let j = 0; j < i; j++) if (places[j]! < place && longest[j]! + 1 > most) [most, from] = [longest[j]! + 1, j];
    longest[i] = most;
    previous[i] = from;
  });
  const kept = new Set<string>();
  for (let i = longest.indexOf(Math.max(0, ...longest)); i >= 0; i = previous[i]!) kept.add(common[i]!);
  return kept;
}
