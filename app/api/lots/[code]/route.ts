import { authoriseRequest } from '@/server/auth/authorise-request';
import { readLotPage } from '@/server/operations/lots/read-lot-page';

/** Everything that the page of a lot shows, for its refresh while the lot is in production. */
export async function GET(request: Request, { params }: { params: Promise<{ code: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const lot = await readLotPage(decodeURIComponent((await params).code));
  if (!lot)
    return Response.json({ ok: false, code: 'lot-unknown', sentence: 'This lot does not exist.' }, { status: 404 });
  return Response.json(lot, { headers: { 'cache-control': 'no-store' } });
}
