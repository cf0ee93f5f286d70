import { authoriseRequest } from '@/server/auth/authorise-request';
import { readOpenCalls } from '@/server/operations/engineering/calls';

/** Benches that call an engineer now; every desk asks every few seconds. */
export async function GET(request: Request): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  return Response.json(await readOpenCalls(), { headers: { 'cache-control': 'no-store' } });
}
