import { isFromHere } from '@/app/same-origin';
import { orRefuse, requireActor } from '@/app/session';
import { exportJob } from '@/lib/services/export/export-job';

/** A whole job as a ZIP. Asked for by POST, since the record keeps that it was taken out. */
export async function POST(
  request: Request,
  { params }: { params: Promise<{ job: string }> },
): Promise<Response> {
  if (!isFromHere(request)) return new Response('Ask for it from the page of the job.', { status: 403 });
  const actor = await requireActor();
  const { name, bytes } = await orRefuse(exportJob(actor, (await params).job));
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/zip',
      'content-disposition': `attachment; filename="${name}"`,
      'cache-control': 'private, no-store',
    },
  });
}
