import { lotViewSchema } from '@/lib/contracts/lot-view';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { listBaselineCandidates } from '@/server/operations/lots/list-baseline-candidates';

/** Earlier lots that this lot's limits can be taken from, for the quantity that the query names. */
export async function GET(request: Request, { params }: { params: Promise<{ code: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'manage-lots');
  if (!allowed.ok) return allowed.response;
  const { quantity } = lotViewSchema.parse(Object.fromEntries(new URL(request.url).searchParams));
  const lots = await listBaselineCandidates(decodeURIComponent((await params).code), quantity);
  return Response.json(lots, { headers: { 'cache-control': 'no-store' } });
}
