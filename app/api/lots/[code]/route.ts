import { lotViewSchema } from '@/lib/contracts/lot-view';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { readLotPage } from '@/server/operations/lots/read-lot-page';

/** Everything that the page of a lot shows but its figures, for its refresh while the lot is in production. */
export async function GET(request: Request, { params }: { params: Promise<{ code: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const view = lotViewSchema.parse(Object.fromEntries(new URL(request.url).searchParams));
  const lot = await readLotPage(decodeURIComponent((await params).code), view);
  if (!lot)
    return Response.json({ ok: false, code: 'lot-unknown', sentence: 'This lot does not exist.' }, { status: 404 });
  return Response.json(lot, { headers: { 'cache-control': 'no-store' } });
}
