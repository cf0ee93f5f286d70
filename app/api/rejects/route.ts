import { rejectFilterSchema } from '@/lib/contracts/reject-list';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { listRejects } from '@/server/operations/rejects/list-rejects';

/** One page of the boards that wait for a decision, by the same query as the page; a lot's page shows its own by it. */
export async function GET(request: Request): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const filter = rejectFilterSchema.parse(Object.fromEntries(new URL(request.url).searchParams));
  return Response.json(await listRejects(filter), { headers: { 'cache-control': 'no-store' } });
}
