import { parseCookie } from 'cookie';
import { readSession } from '@/server/auth/read-session';

/** Whether this browser's session still holds. Open pages ask every few seconds, so that an ended session ends them. */
export async function GET(request: Request): Promise<Response> {
  const actor = await readSession(parseCookie(request.headers.get('cookie') ?? ''));
  return Response.json({ signedIn: actor !== null }, { headers: { 'cache-control': 'no-store' } });
}
