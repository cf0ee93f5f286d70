import { authoriseRequest } from '@/server/auth/authorise-request';
import { exportSequence } from '@/server/operations/engineering/sequences/export-sequence';

const isId = (text: string) => /^[0-9a-f-]{36}$/.test(text);

/** A revision as a file to keep: ?revision=r7. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const { id } = await params;
  const number = /^r(\d{1,6})$/.exec(new URL(request.url).searchParams.get('revision') ?? '')?.[1];
  const file = isId(id) && number ? await exportSequence(id, Number(number)) : null;
  if (!file)
    return Response.json(
      { ok: false, code: 'revision-unknown', sentence: 'There is no such revision.' },
      { status: 404 },
    );
  return new Response(file.text, {
    headers: {
      'content-type': 'application/json',
      'content-disposition': `attachment; filename="${file.fileName}"`,
      'cache-control': 'no-store',
    },
  });
}
