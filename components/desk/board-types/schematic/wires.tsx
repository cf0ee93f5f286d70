/** Wires, nodes and symbols; right angles only, crossings broken. The words beside them are the fields'. */
export function Wires() {
  const nodes = [
    [46, 25],
    [232, 25],
    [428, 25],
    [756, 25],
    [46, 389],
    [232, 389],
    [428, 389],
    [756, 389],
    [428, 154],
    [548, 197],
    [692, 176],
  ] as const;
  return (
    <g fill="none" stroke="var(--sw-ink)" strokeWidth={2}>
      <path d="M26 25H776M26 389H776" />
      <path d="M26 17V33M26 381V397" strokeWidth={4} />
      <path d="M46 25V186M46 200V389M232 25V59M232 116V165M232 228V277M232 334V389" />
      <path d="M28 186H64M28 200H64" strokeWidth={4} />
      <path d="M254 197H420M436 197H572M428 25V50M428 106V281M428 308V389M428 154H572" />
      <path d="M668 176H722M548 197V285H600M664 285H692V176M756 25V150M756 203V251M756 320V389" />
      <path d="M408 288V281H448V274" />
      <g fill="var(--sw-sheet)">
        <path d="M222 59h20v57h-20zM222 165h20v63h-20zM222 277h20v57h-20zM418 50h20v56h-20zM600 275h64v20h-64z" />
        <path d="M414 308h28l-14-27zM572 126v99l96-49z" />
        <path d="M722 150h69v53h-69z" />
      </g>
      <path d="M734 251h44v69h-44z" fill="var(--sw-well)" />
      <path d="M756 150v13M756 190v13M756 190l-12-25M722 176h14" />
      <path d="M243 197l12-7v14z" fill="var(--sw-ink)" stroke="none" />
      <g fill="var(--sw-ink)" stroke="none">
        {nodes.map(([x, y]) => (
          <rect key={`${x},${y}`} x={x - 4} y={y - 4} width={8} height={8} />
        ))}
      </g>
      <g fill="var(--sw-ink)" stroke="none" fontSize={14} fontWeight={700}>
        <text x={26} y={12} fontWeight={400}>
          supply +
        </text>
        <text x={26} y={414} fontWeight={400}>
          supply −
        </text>
        <text x={24} y={179} fontWeight={400}>
          +
        </text>
        <text x={580} y={159} fontSize={16}>
          −
        </text>
        <text x={580} y={203} fontSize={16}>
          +
        </text>
        <text x={605} y={181}>
          U1
        </text>
        <text x={756} y={290} textAnchor="middle">
          load
        </text>
      </g>
    </g>
  );
}
