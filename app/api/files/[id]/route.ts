import { authoriseRequest } from '@/server/auth/authorise-request';
import { readFile } from '@/server/operations/files/read-file';

const isId = (text: string) => /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(text);

/** A stored picture or drawing, as desks and benches show it. Files never change, so a browser may keep them. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'bench');
  if (!allowed.ok) return allowed.response;
  const { id } = await params;
  const found = isId(id) ? await readFile(id) : null;
  if (!found)
    return Response.json({ ok: false, code: 'file-unknown', sentence: 'This file does not exist.' }, { status: 404 });
  const { file, body } = found;
  const picture = file.mediaType.startsWith('image/');
  return new Response(body, {
    headers: {
      'content-type': file.mediaType,
      'content-length': String(file.bytes),
      'content-disposition': picture
        ? 'inline'
        : `attachment; filename*=UTF-8''${encodeURIComponent(file.originalName)}`,
      'x-content-type-options': 'nosniff',
      'content-security-policy': "default-src 'none'; sandbox",
      'cache-control': 'private, max-age=31536000, immutable',
      etag: `"${file.sha256}"`,
    },
  });
}
