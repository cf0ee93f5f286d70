const unreachable = 'The server did not answer. Try again in a moment.';

/** The sentence for what next-auth hands back: a code of ours, with the time of the next try behind a bar where there is one. */
export function signInProblem(error: string | null, nowMs = Date.now()): string {
  const [code, retryAtIso] = (error ?? '').split('|');
  if (code === 'wrong-sign-in') return 'The e-mail address and the password do not belong together. Check both.';
  if (code !== 'too-many-tries') return unreachable;
  const seconds = retryAtIso ? Math.max(1, Math.ceil((Date.parse(retryAtIso) - nowMs) / 1000)) : 60;
  const wait =
    seconds < 90 ? `${seconds} ${seconds === 1 ? 'second' : 'seconds'}` : `${Math.ceil(seconds / 60)} minutes`;
  return `Too many wrong tries. Wait ${wait}, then try again.`;
}
