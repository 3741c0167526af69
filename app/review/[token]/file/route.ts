import { requestAddress } from '@/app/session';
import { readReviewFile, reviewDoor } from '@/lib/services/open-review';

/** The sealed file, for whoever holds the link. */
export async function GET(
  _request: Request,
  { params }: { params: Promise<{ token: string }> },
): Promise<Response> {
  const { token } = await params;
  const door = await reviewDoor(token, await requestAddress());
  if (!door.open) return new Response('This link does not open anything any more.', { status: 410 });
  const bytes = await readReviewFile(door.link);
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': 'inline; filename="calculations.pdf"',
      'cache-control': 'private, no-store',
    },
  });
}
