/** A board from above with the trimmer in a blue frame. Not to scale, and not of one board type. */
export function BoardPicture({ label }: { label: string }) {
  return (
    <svg viewBox="0 0 640 326" role="img" aria-label={label.replace('\n', ' ')} className="block h-auto w-full">
      <g fill="none" stroke="var(--sw-ink-2)" strokeWidth={2.5}>
        <rect x={2} y={2} width={440} height={320} fill="var(--sw-sheet)" stroke="var(--sw-ink)" strokeWidth={4} />
        {[
          [26, 26],
          [418, 26],
          [26, 298],
          [418, 298],
        ].map(([x, y]) => (
          <circle key={`${x}${y}`} cx={x} cy={y} r={11} />
        ))}
        <path d="M58 32h114v56H58zM272 236h114v56H272z" />
        {[78, 115, 152].map((x) => (
          <circle key={x} cx={x} cy={60} r={11} />
        ))}
        {[292, 329, 366].map((x) => (
          <circle key={x} cx={x} cy={264} r={11} />
        ))}
        <path d="M212 48h78v36h-78z" fill="var(--sw-well)" />
        <circle cx={100} cy={192} r={48} />
        <path d="M100 144v96M188 168h66v46h-66zM198 168v-10m14 10v-10m14 10v-10m14 10v-10m-42 66v-10m14 10v-10m14 10v-10m14 10v-10M174 250h16v44h-16zM203 250h16v44h-16zM232 250h16v44h-16z" />
        <rect x={312} y={76} width={76} height={78} fill="var(--sw-well)" />
      </g>
      <circle cx={350} cy={115} r={22} fill="var(--sw-sheet)" stroke="var(--sw-ink)" strokeWidth={4} />
      <path d="M350 94v42" stroke="var(--sw-ink)" strokeWidth={8} />
      <path d="M296 60h110v110H296zM410 115h70" fill="none" stroke="var(--sw-accent)" strokeWidth={8} />
      <text y={110} fontWeight={700} fontSize={28} fill="var(--sw-accent)">
        {label.split('\n').map((line) => (
          <tspan key={line} x={492} dy={line === label.split('\n')[0] ? 0 : 34}>
            {line}
          </tspan>
        ))}
      </text>
    </svg>
  );
}
