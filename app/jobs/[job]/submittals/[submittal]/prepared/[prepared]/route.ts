import { orRefuse, requireActor } from '@/app/session';
import { readPreparedFile } from '@/lib/services/read-file';

/** The bytes that are to be signed, for the browser of the person they were prepared for. */
export async function GET(
  _request: Request,
  { params }: { params: Promise<{ prepared: string }> },
): Promise<Response> {
  const actor = await requireActor();
  const { prepared } = await params;
  const bytes = await orRefuse(readPreparedFile(actor, prepared));
  return new Response(new Uint8Array(bytes), {
    headers: { 'content-type': 'application/octet-stream', 'cache-control': 'private, no-store' },
  });
}
