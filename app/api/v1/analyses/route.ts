import { problem } from '@/app/api/problem';
import { readBody } from '@/app/read-body';
import { isFromHere } from '@/app/same-origin';
import { currentActor } from '@/app/session';
import { log } from '@/lib/log';
import type { Actor } from '@/lib/services/actor';
import { readApiToken } from '@/lib/services/read-api-token';
import { NotAllowed } from '@/lib/services/service-error';
import { solveAnalysis } from '@/lib/services/solve-analysis';

const mostBytes = 4 * 1024 * 1024;

/** Solves the analysis in the body and answers results and written steps. `?figures=yes` adds the drawings. */
export async function POST(request: Request): Promise<Response> {
  const actor = await whoAsks(request);
  if (!actor)
    return problem({
      status: 401,
      code: 'not-signed-in',
      detail: 'Send an access token: Authorization: Bearer …',
      headers: { 'www-authenticate': 'Bearer' },
    });
  const body = await readBody(request, mostBytes);
  if (!body) return problem({ status: 413, code: 'too-large', detail: 'The body is larger than 4 MB.' });
  const json = parseJson(body.toString('utf8'));
  if (!json.ok) return problem({ status: 400, code: 'not-json', detail: 'The body is not JSON.' });
  try {
    const figures = new URL(request.url).searchParams.get('figures') === 'yes';
    const solved = await solveAnalysis(actor, json.value, figures);
    if (solved.ok) return Response.json(solved.answer, { headers: { 'cache-control': 'no-store' } });
    const { code, message: detail, place } = solved.refusal;
    return problem({ status: solved.tooOften ? 429 : 422, code, detail, place });
  } catch (error) {
    if (error instanceof NotAllowed)
      return problem({ status: 403, code: 'not-allowed', detail: 'Only engineers of the office solve.' });
    log.error({ err: error, person: actor.personId }, 'an analysis could not be answered');
    return problem({ status: 500, code: 'fault', detail: 'Something failed here. It is in the log.' });
  }
}

/** The holder of the token, or who is signed in, if the request comes from a page of this site. */
async function whoAsks(request: Request): Promise<Actor | undefined> {
  const header = request.headers.get('authorization');
  if (header !== null) {
    const token = /^Bearer ([\w-]{10,100})$/.exec(header)?.[1];
    return token ? readApiToken(token) : undefined;
  }
  return isFromHere(request) ? currentActor() : undefined;
}

function parseJson(text: string): { ok: true; value: unknown } | { ok: false } {
  try {
    return { ok: true, value: JSON.parse(text) };
  } catch {
    return { ok: false };
  }
}
