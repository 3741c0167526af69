import { randomBytes } from 'node:crypto';
import { type NextRequest, NextResponse } from 'next/server';
import { contentPolicy } from './app/content-policy';

/** Gives each page a policy of its own: only scripts and styles that carry this answer's nonce run. */
export function proxy(request: NextRequest): NextResponse {
  const secure = request.nextUrl.protocol === 'https:';
  // Next.js writes this name out while building; only its development server needs the looser policy.
  const developing = process.env.NODE_ENV === 'development';
  const policy = contentPolicy(randomBytes(16).toString('base64'), secure, developing);
  const headers = new Headers(request.headers);
  // Next.js reads the nonce from the request's policy and writes it on its own scripts.
  headers.set('Content-Security-Policy', policy);
  const answer = NextResponse.next({ request: { headers } });
  answer.headers.set('Content-Security-Policy', policy);
  return answer;
}

export const config = { matcher: ['/((?!_next/static|_next/image|favicon.ico|.*/file$).*)'] };
