/** Limits that a share of the boards cannot meet, as the prediction beside the page says; `ask` is what to do about them. */
export function Misses({ misses, ask }: { misses: readonly string[]; ask: string }) {
  if (misses.length === 0) return null;
  return (
    <div className="border-l-[10px] border-attn bg-attn-wash px-3 py-2">
      <p className="font-bold">Not every board can meet these limits. {ask}</p>
      {misses.map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
    </div>
  );
}
