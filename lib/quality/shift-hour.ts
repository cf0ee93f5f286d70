/** Minutes after midnight on the clocks of a time zone (IANA name). */
function clockReader(timeZone: string): (at: Date) => number {
  const format = new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit', hourCycle: 'h23' });
  return (at) => {
    const [hour, minute] = format.format(at).split(':').map(Number);
    return hour! * 60 + minute!;
  };
}

/**
 * Which hour of its shift a moment falls in, from 1. `starts` are the beginnings of the shifts, such as 06:00; none means that the
 * day begins at midnight. The returned function may be called for thousands of boards.
 */
export function shiftHourReader(timeZone: string, starts: readonly string[]): (at: Date) => number {
  const read = clockReader(timeZone);
  const beginnings = starts
    .map((start) => start.split(':').map(Number))
    .map(([hour, minute]) => hour! * 60 + (minute ?? 0));
  return (at) => {
    const now = read(at);
    // A shift that began yesterday goes on after midnight.
    const since = (beginnings.length > 0 ? beginnings : [0]).map((start) => (now - start + 1440) % 1440);
    return Math.floor(Math.min(...since) / 60) + 1;
  };
}
