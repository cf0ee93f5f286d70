import { authoriseRequest } from '@/server/auth/authorise-request';
import { readStationsOverview } from '@/server/operations/engineering/read-stations';

/** Every station, most urgent first; the list of stations asks every few seconds. */
export async function GET(request: Request): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  return Response.json(await readStationsOverview(), { headers: { 'cache-control': 'no-store' } });
}
