import { authoriseRequest } from '@/server/auth/authorise-request';
import { readStationPage } from '@/server/operations/engineering/read-station-page';

/** One station with its due dates, for its page's refresh. */
export async function GET(request: Request, { params }: { params: Promise<{ code: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const station = await readStationPage(decodeURIComponent((await params).code));
  if (!station)
    return Response.json(
      { ok: false, code: 'station-unknown', sentence: 'This station does not exist.' },
      { status: 404 },
    );
  return Response.json(station, { headers: { 'cache-control': 'no-store' } });
}
