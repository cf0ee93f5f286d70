import { z } from 'zod';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { readDryRun } from '@/server/operations/engineering/dry-runs/read-dry-run';

/** How far a dry run has come and what it found, for pages that watch it. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const id = z.uuid().safeParse((await params).id);
  const run = id.success ? await readDryRun(id.data) : null;
  if (!run)
    return Response.json(
      { ok: false, code: 'dry-run-unknown', sentence: 'This dry run does not exist.' },
      { status: 404 },
    );
  return Response.json(run, { headers: { 'cache-control': 'no-store' } });
}
