import { lotViewSchema } from '@/lib/contracts/lot-view';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { readLotReview } from '@/server/operations/lots/read-lot-review';

/** The figures of a lot for the view that the query names. */
export async function GET(request: Request, { params }: { params: Promise<{ code: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const view = lotViewSchema.parse(Object.fromEntries(new URL(request.url).searchParams));
  const review = await readLotReview(decodeURIComponent((await params).code), view);
  if (!review)
    return Response.json({ ok: false, code: 'lot-unknown', sentence: 'This lot does not exist.' }, { status: 404 });
  return Response.json(review, { headers: { 'cache-control': 'no-store' } });
}
