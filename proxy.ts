import { NextResponse, type NextRequest } from 'next/server';

/**
 * What a page may load. Scripts need the nonce of their request. KaTeX places its parts by style attributes, hence the one
 * inline allowance; style elements and sheets need the nonce or this origin.
 */
function contentSecurityPolicy(nonce: string, development: boolean): string {
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ''}`,
    // The error overlay of the development server writes its styles without a nonce.
    `style-src 'self' ${development ? "'unsafe-inline'" : `'nonce-${nonce}'`}`,
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data:",
    "font-src 'self'",
    `connect-src 'self'${development ? ' ws:' : ''}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

const otherHeaders: Readonly<Record<string, string>> = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'strict-origin-when-cross-origin',
  'Permissions-Policy': 'camera=(), microphone=(), geolocation=(), payment=(), usb=(), interest-cohort=()',
  'Cross-Origin-Opener-Policy': 'same-origin',
};

/** Pages whose address carries a secret, which must not be told to the next page. */
const isSecretAddress = (pathname: string): boolean => /^\/(invitation|reset)(\/|$)/.test(pathname);

/** Every page goes through here for its security headers; Next.js reads the nonce off the request's policy. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = btoa(String.fromCharCode(...crypto.getRandomValues(new Uint8Array(18))));
  const policy = contentSecurityPolicy(nonce, process.env.NODE_ENV === 'development');
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('Content-Security-Policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  for (const [name, value] of Object.entries(otherHeaders)) response.headers.set(name, value);
  if (isSecretAddress(request.nextUrl.pathname)) response.headers.set('Referrer-Policy', 'no-referrer');
  return response;
}

export const config = {
  // Files carry no markup, and answers of the API set their own headers.
  matcher: ['/((?!api/|_next/static|_next/image|favicon.svg|logo.svg).*)'],
};
