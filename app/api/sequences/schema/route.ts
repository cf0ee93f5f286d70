import schema from '@/lib/sequence/sillwright-sequence.schema.json';

/** The published JSON Schema of sequence files. */
export function GET(): Response {
  return new Response(`${JSON.stringify(schema, null, 2)}\n`, {
    headers: { 'content-type': 'application/schema+json' },
  });
}
