import { readBody } from '@/app/read-body';
import { requestAddress } from '@/app/session';
import { mostBytes, verifyFile } from '@/lib/services/verification/verify-file';

/** Verifies the PDF that is the body of the request. Open to everybody; nothing of it is kept. */
export async function POST(request: Request): Promise<Response> {
  const bytes = await readBody(request, mostBytes);
  if (!bytes) return say(413, `The file is larger than ${mostBytes / 1024 / 1024} MB and was not read.`);
  if (bytes.length === 0) return say(400, 'The file is empty.');
  const verified = await verifyFile(bytes, await requestAddress());
  if (!verified)
    return say(429, 'Many files came from your address. Wait a quarter of an hour, then try again.');
  return Response.json(verified, { headers: { 'cache-control': 'no-store' } });
}

function say(status: number, message: string): Response {
  return Response.json({ message }, { status, headers: { 'cache-control': 'no-store' } });
}
