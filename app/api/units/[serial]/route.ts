import { authoriseRequest } from '@/server/auth/authorise-request';
import { readUnitPage } from '@/server/operations/units/read-unit-page';

/** Everything on record of one board, for its page's refresh. */
export async function GET(request: Request, { params }: { params: Promise<{ serial: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const unit = await readUnitPage(decodeURIComponent((await params).serial));
  if (!unit)
    return Response.json({ ok: false, code: 'unit-unknown', sentence: 'This board does not exist.' }, { status: 404 });
  return Response.json(unit, { headers: { 'cache-control': 'no-store' } });
}
