import { actorMay } from '@/lib/access/actor';
import { fileUploadSchema } from '@/lib/contracts/file-upload';
import { parseForm } from '@/lib/contracts/parse-form';
import { authoriseRequest, refusedResponse } from '@/server/auth/authorise-request';
import { receiveFile } from '@/server/operations/files/receive-file';

/** Stores the body as a file: `?kind=trimmer-photo&name=front.jpg`. Answers with its facts, or with the sentence that refuses it. */
export async function POST(request: Request): Promise<Response> {
  const allowed = await authoriseRequest(request, 'edit-board-types');
  if (!allowed.ok) return allowed.response;
  const asked = parseForm(fileUploadSchema, Object.fromEntries(new URL(request.url).searchParams));
  if (!asked.ok) return Response.json(asked, { status: 400 });
  if (asked.value.kind === 'instruction-picture' && !actorMay(allowed.actor, 'edit-sequences'))
    return refusedResponse('not-allowed');
  const stored = await receiveFile(allowed.actor, asked.value, request.body);
  return Response.json(stored, { status: stored.ok ? 201 : 400 });
}
