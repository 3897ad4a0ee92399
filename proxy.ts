import { type NextRequest, NextResponse } from 'next/server';
import { refused } from '@/lib/entry/http-guard';

/** Who may ask for a page, and what a page may do: scripts only from here, and only those that carry this request's nonce. */
export function proxy(request: NextRequest): Response {
  const no = refused(request);
  if (no) return no;
  const nonce = btoa(crypto.randomUUID());
  const policy = contentPolicy(nonce, process.env.NODE_ENV === 'development');
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  return response;
}

/**
 * style-src-attr is open because React's server-rendered style attributes are blocked without it. The development server
 * evaluates code and adds styles of its own; a nonce would switch its 'unsafe-inline' off.
 */
const contentPolicy = (nonce: string, development: boolean): string =>
  [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ''}`,
    development ? "style-src 'self' 'unsafe-inline'" : `style-src 'self' 'nonce-${nonce}'`,
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');

/** Not the routes of the interface, which guard themselves and stream long bodies, nor files that never change. */
export const config = { matcher: [{ source: '/((?!api/|_next/static|_next/image|icon.svg).*)' }] };
