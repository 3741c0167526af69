import { analysisJsonSchema } from '@/lib/services/solve-analysis';

/** The form that is read, as JSON schema; open to everybody. */
export function GET(): Response {
  return Response.json(analysisJsonSchema(), {
    headers: { 'content-type': 'application/schema+json', 'cache-control': 'public, max-age=3600' },
  });
}
