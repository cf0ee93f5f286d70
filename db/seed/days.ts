const dayMs = 86_400_000;

export function daysFrom(now: Date, days: number): Date {
  return new Date(now.getTime() + days * dayMs);
}

/** The calendar day in UTC, such as 2026-12-01. */
export function dayOf(at: Date): string {
  return at.toISOString().slice(0, 10);
}

/** Two digits each of year and week by ISO 8601, as lots and serial numbers are numbered: 2649. */
export function yearAndWeek(at: Date): string {
  const thursday = new Date(Date.UTC(at.getUTCFullYear(), at.getUTCMonth(), at.getUTCDate()));
  thursday.setUTCDate(thursday.getUTCDate() + 4 - (thursday.getUTCDay() || 7));
  const yearStart = Date.UTC(thursday.getUTCFullYear(), 0, 1);
  const week = Math.ceil(((thursday.getTime() - yearStart) / dayMs + 1) / 7);
  return String(thursday.getUTCFullYear() % 100).padStart(2, '0') + String(week).padStart(2, '0');
}
