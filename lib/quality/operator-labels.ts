/** A, B, … Z, AA: by order of first appearance. */
function letters(place: number): string {
  return place < 26 ? String.fromCharCode(65 + place) : letters(Math.floor(place / 26) - 1) + letters(place % 26);
}

/** How operators are called where the site does not show who they are: letters, in order of first appearance in the lot. */
export function operatorLetters(ids: readonly string[]): Map<string, string> {
  return new Map([...new Set(ids)].map((id, i) => [id, letters(i)]));
}
