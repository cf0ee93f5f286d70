import { readingsAsCsv } from '@/lib/contracts/readings-csv';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { readUnitPage } from '@/server/operations/units/read-unit-page';

/** All readings of a board as CSV, one a line, oldest attempt first. */
export async function GET(request: Request, { params }: { params: Promise<{ serial: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const unit = await readUnitPage(decodeURIComponent((await params).serial));
  if (!unit)
    return Response.json({ ok: false, code: 'unit-unknown', sentence: 'This board does not exist.' }, { status: 404 });
  return new Response(readingsAsCsv(unit), {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': `attachment; filename="readings-${unit.serial.replace(/[^\w.-]/g, '_')}.csv"`,
      'cache-control': 'no-store',
    },
  });
}
