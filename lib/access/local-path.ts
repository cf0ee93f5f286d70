/** The address to go on to after signing in: `given` when it is a path of ours, else `otherwise`. Never another site. */
export function localPath(given: string | undefined, otherwise = '/'): string {
  return given && /^\/(?![/\\])[^\s\\]*$/.test(given) ? given : otherwise;
}
