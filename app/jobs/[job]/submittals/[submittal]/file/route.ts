import { orRefuse, requireActor } from '@/app/session';
import { readSubmittalFile } from '@/lib/services/read-file';

/** The package of a submittal as it stands. */
export async function GET(
  _request: Request,
  { params }: { params: Promise<{ submittal: string }> },
): Promise<Response> {
  const actor = await requireActor();
  const { submittal } = await params;
  const bytes = await orRefuse(readSubmittalFile(actor, submittal));
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': 'inline; filename="calculations.pdf"',
      'cache-control': 'private, no-store',
    },
  });
}
