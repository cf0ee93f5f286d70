const loopbackNames = ['127.0.0.1', 'localhost', '[::1]'];

/**
 * Whether a page at `origin` may write or open a socket here. `publicUrl` is the address people type; the names of this
 * computer count as one, on the same port. A request without an origin is refused: browsers send one with every write.
 */
export function originAllowed(origin: string | null | undefined, publicUrl: string): boolean {
  if (!origin) return false;
  let given: URL;
  try {
    given = new URL(origin);
  } catch {
    return false;
  }
  const own = new URL(publicUrl);
  if (given.origin === own.origin) return true;
  const bothLoopback = loopbackNames.includes(given.hostname) && loopbackNames.includes(own.hostname);
  return bothLoopback && given.protocol === own.protocol && given.port === own.port;
}
