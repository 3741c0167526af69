import { orRefuse, requireActor } from '@/app/session';
import { printResponses } from '@/lib/services/print-responses';

/** The itemised answers to all comments on a job, as PDF. */
export async function GET(_: Request, { params }: { params: Promise<{ job: string }> }): Promise<Response> {
  const actor = await requireActor();
  const bytes = await orRefuse(printResponses(actor, (await params).job));
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': 'inline; filename="answers.pdf"',
      'cache-control': 'private, no-store',
    },
  });
}
