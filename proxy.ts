import { randomBytes } from 'node:crypto';
import { NextResponse, type NextRequest } from 'next/server';
import { PATH_HEADER } from '@/lib/auth/local-path';

const NONCE_BYTES = 16;
const SECURITY_HEADERS = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'same-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
};

function contentSecurityPolicy(nonce: string): string {
  // React rebuilds server stacks with eval in development, and only there.
  const development = process.env.NODE_ENV === 'development' ? " 'unsafe-eval'" : '';
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

/** Sets security headers and tells pages their own path; it decides nothing about who may do what. */
export function proxy(request: NextRequest): NextResponse {
  const policy = contentSecurityPolicy(randomBytes(NONCE_BYTES).toString('base64'));
  const headers = new Headers(request.headers);
  // Next finds the nonce for its own scripts in this header of the request.
  headers.set('Content-Security-Policy', policy);
  headers.set(PATH_HEADER, request.nextUrl.pathname + request.nextUrl.search);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  for (const [name, value] of Object.entries(SECURITY_HEADERS)) response.headers.set(name, value);
  return response;
}

// Route handlers set their own headers and take large bodies, which should not pass through here.
export const config = {
  matcher: ['/((?!api/|_next/static|_next/image|favicon\\.).*)'],
};
