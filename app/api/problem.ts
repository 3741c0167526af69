import type { Place } from '@/lib/model/refusal';

interface Problem {
  status: number;
  /** For programs: "unstable", "form", "too-often". */
  code: string;
  /** For people. */
  detail: string;
  place?: Place;
  headers?: Record<string, string>;
}

/** A refusal as problem details (RFC 9457), with the code and the place of what is wrong. */
export function problem({ status, code, detail, place, headers }: Problem): Response {
  return new Response(JSON.stringify({ type: 'about:blank', title: code, status, code, detail, place }), {
    status,
    headers: { 'content-type': 'application/problem+json', 'cache-control': 'no-store', ...headers },
  });
}
