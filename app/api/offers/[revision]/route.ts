import { authoriseRequest } from '@/server/auth/authorise-request';
import { listOffersOf } from '@/server/operations/engineering/offers/list-offers';

const isId = (text: string) => /^[0-9a-f-]{36}$/.test(text);

/** Where a revision is tried, for the refresh while an offer is open. */
export async function GET(request: Request, { params }: { params: Promise<{ revision: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const { revision } = await params;
  const offers = isId(revision) ? await listOffersOf(revision) : [];
  return Response.json(offers, { headers: { 'cache-control': 'no-store' } });
}
