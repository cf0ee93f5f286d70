import { authoriseRequest } from '@/server/auth/authorise-request';
import { readCertificatePdf } from '@/server/operations/certificates/read-certificate-pdf';

const isId = (text: string) => /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(text);

/** The paper of a certificate as it was issued. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'signed-in');
  if (!allowed.ok) return allowed.response;
  const { id } = await params;
  const found = isId(id) ? await readCertificatePdf(id) : null;
  if (!found)
    return Response.json(
      { ok: false, code: 'certificate-unknown', sentence: 'This certificate does not exist.' },
      { status: 404 },
    );
  return new Response(found.body, {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': `inline; filename*=UTF-8''${encodeURIComponent(`${found.number}.pdf`)}`,
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, max-age=31536000, immutable',
      etag: `"${found.sha256}"`,
    },
  });
}
