interface FixturePictureProps {
  lid: 'open' | 'closing' | 'closed' | 'opening';
  board: 'in' | 'out' | 'entering' | 'leaving';
  /** A brush at the trimmer. */
  seal?: boolean;
}

/** The fixture from the side: base with nails, board, lid. Blue arrows show the move. */
export function FixturePicture({ lid, board, seal = false }: FixturePictureProps) {
  const down = lid === 'closed' || lid === 'opening';
  return (
    <svg viewBox="-10 0 440 400" aria-hidden="true" className="block h-auto w-full">
      <g fill="none" stroke="var(--sw-ink)" strokeWidth={5}>
        <path d="M30 320h320v56H30z" fill="var(--sw-well)" />
        {[80, 130, 180, 230, 280].map((x) => (
          <path key={x} d={`M${x} 320v-26`} strokeWidth={4} />
        ))}
        {board !== 'out' && (
          <g transform={board === 'entering' || board === 'leaving' ? 'translate(0 -84)' : undefined}>
            <path d="M62 276h240v18H62z" fill="var(--sw-sheet)" />
            <path d="M196 246h44v30h-44z" fill="var(--sw-well)" />
            <path d="M86 254h40v22H86z" />
          </g>
        )}
        <g transform={down ? undefined : 'rotate(52 336 300)'}>
          <path d="M40 214h300v28H40z" fill="var(--sw-sheet)" />
          <path d="M60 242v22M320 242v46" />
        </g>
      </g>
      <g fill="none" stroke="var(--sw-accent)" strokeWidth={9}>
        {(board === 'entering' || board === 'leaving') && (
          <path d={board === 'entering' ? 'M182 70v66m-22-24 22 24 22-24' : 'M182 136V70m-22 24 22-24 22 24'} />
        )}
        {lid === 'closing' && <path d="M60 90q-40 60-24 104m-24-18 24 18 18-24" />}
        {lid === 'opening' && <path d="M36 194q-16-44 24-104m-26 14 26-14 6 28" />}
        {seal && <path d="M218 236 262 150l22 12-44 82zM262 150l18-36 24 12-20 36" fill="var(--sw-sheet)" />}
      </g>
    </svg>
  );
}
