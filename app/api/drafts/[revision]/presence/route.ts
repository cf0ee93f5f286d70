import { refusal } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { presenceSchema } from '@/lib/contracts/sequence-draft';
import { authoriseRequest } from '@/server/auth/authorise-request';
import { renewPresence } from '@/server/operations/engineering/sequences/draft-presence';

const isId = (text: string) => /^[0-9a-f-]{36}$/.test(text);

/** A tab of the editor says that it has the draft open, and hears who else has. */
export async function POST(request: Request, { params }: { params: Promise<{ revision: string }> }): Promise<Response> {
  const allowed = await authoriseRequest(request, 'edit-sequences');
  if (!allowed.ok) return allowed.response;
  const { revision } = await params;
  const form = parseForm(presenceSchema, await request.json().catch(() => null));
  if (!form.ok || !isId(revision))
    return Response.json(form.ok ? refusal('revision-unknown', 'This draft does not exist.') : form, { status: 400 });
  const outcome = await renewPresence(allowed.actor, { revisionId: revision, ...form.value });
  return Response.json(outcome, { status: outcome.ok ? 200 : 404, headers: { 'cache-control': 'no-store' } });
}
