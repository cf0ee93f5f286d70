/** What to do with a board whose paper does not hold. */
export function Advice({ steps }: { steps: readonly string[] }) {
  return (
    <ol className="mt-6 border-t border-hair">
      {steps.map((step, i) => (
        <li key={step} className="flex gap-5 border-b border-hair py-3">
          <b className="font-num">{i + 1}</b>
          <span>{step}</span>
        </li>
      ))}
    </ol>
  );
}

export const callTheMaker =
  'Keep the board apart and call the maker: the number is on your delivery note. Do not use the board before that.';
