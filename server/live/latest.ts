/** Passes the first value on at once; of those that follow within `apartMs` of the last one passed, only the latest. */
export function latestOf<T>(apartMs: number, pass: (value: T) => void): (value: T) => void {
  let timer: NodeJS.Timeout | null = null;
  let waiting: { value: T } | null = null;
  const rest = () => {
    timer = setTimeout(() => {
      timer = null;
      if (!waiting) return;
      const { value } = waiting;
      waiting = null;
      pass(value);
      rest();
    }, apartMs);
  };
  return (value) => {
    if (timer) {
      waiting = { value };
      return;
    }
    pass(value);
    rest();
  };
}
