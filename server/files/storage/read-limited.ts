/** The body of a request as it arrives, given up as soon as it is longer than `mostBytes`; then null. */
export async function readLimited(
  body: ReadableStream<Uint8Array> | null,
  mostBytes: number,
): Promise<Uint8Array | null> {
  if (!body) return new Uint8Array();
  const chunks: Uint8Array[] = [];
  let length = 0;
  const reader = body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return Buffer.concat(chunks);
    length += value.length;
    if (length > mostBytes) {
      await reader.cancel().catch(() => {});
      return null;
    }
    chunks.push(value);
  }
}
