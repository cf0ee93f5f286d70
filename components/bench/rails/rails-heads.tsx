import { useTranslations } from 'next-intl';

/** "Trip, falling" over the left rail, "Release, rising" over the right one. */
export function RailsHeads() {
  const t = useTranslations('bench.rails');
  return (
    <g>
      <path d="M114 33h32l-16 24z" fill="var(--sw-trip)" />
      <text x={156} y={58} fontWeight={700} fontSize={40} fill="var(--sw-trip)">
        {t('trip')}
      </text>
      <text x={156} y={95} fontSize={29} fill="var(--sw-ink-2)">
        {t('falling')}
      </text>
      <path d="M451 57h32l-16-24z" fill="var(--sw-release)" />
      <text x={491} y={58} fontWeight={700} fontSize={40} fill="var(--sw-release)">
        {t('release')}
      </text>
      <text x={491} y={95} fontSize={29} fill="var(--sw-ink-2)">
        {t('rising')}
      </text>
    </g>
  );
}
