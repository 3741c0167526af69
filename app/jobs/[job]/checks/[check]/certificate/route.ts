import { orRefuse, requireActor } from '@/app/session';
import { printCertificate } from '@/lib/services/print-certificate';

/** The certificate of a check with its schedule of marks and queries. */
export async function GET(
  _request: Request,
  { params }: { params: Promise<{ check: string }> },
): Promise<Response> {
  const actor = await requireActor();
  const { check } = await params;
  const { name, bytes } = await orRefuse(printCertificate(actor, check));
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': `inline; filename="${name}"`,
      'cache-control': 'private, no-store',
    },
  });
}
