interface MiniGaugeProps {
  value: number;
  min: number | null;
  max: number | null;
  tone?: 'trip' | 'release' | 'plain';
  /** Read aloud, such as "12.55, limits 12.10 to 12.50". */
  label: string;
}

const width = 140;

/** One value against its limits: jaws on the limits, a dot within, a red square outside; far values sit at the edge. */
export function MiniGauge({ value, min, max, tone = 'plain', label }: MiniGaugeProps) {
  const low = min ?? Math.min(value, (max ?? value) - Math.abs(max ?? 1));
  const high = max ?? Math.max(value, low + Math.abs(low || 1));
  const at = (v: number) => Math.min(width - 6, Math.max(6, 28 + ((v - low) / (high - low || 1)) * 68));
  const inside = (min === null || value >= min) && (max === null || value <= max);
  const colour = tone === 'plain' ? 'var(--sw-ink-2)' : `var(--sw-${tone})`;
  const wash = tone === 'plain' ? 'var(--sw-hair)' : `var(--sw-${tone}-wash)`;
  return (
    <svg viewBox={`0 0 ${width} 20`} width={width} height={20} role="img" aria-label={label} className="max-w-full">
      <path d={`M0 14H${width}`} stroke="var(--sw-rule)" />
      <rect x={at(low)} y={8} width={at(high) - at(low)} height={6} fill={wash} />
      {min !== null && <path d={`M${at(min)} 4V14H${at(min) - 6}Z`} fill={colour} />}
      {max !== null && <path d={`M${at(max)} 4V14H${at(max) + 6}Z`} fill={colour} />}
      {inside ? (
        <circle cx={at(value)} cy={14} r={4} fill="var(--sw-ink)" />
      ) : (
        <rect x={at(value) - 4} y={10} width={8} height={8} fill="var(--sw-reject)" />
      )}
    </svg>
  );
}
