import { NextResponse, type NextRequest } from 'next/server'
import { isProduction, isServedByTls } from '@/lib/env'
import { notFound } from '@/lib/http/not-found'

/** Scripts run only with this request's nonce; styles may be inline because React and the toaster write style attributes. */
function policy(nonce: string): string {
  // React's refresh evaluates code and talks over a web socket; neither exists in production.
  const development = isProduction() ? '' : " 'unsafe-eval'"
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    `connect-src 'self'${isProduction() ? '' : ' ws:'}`,
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')
}

/** The path of a mesh is the only part of an address in which a file's own name stands. */
function isMeshPath(pathname: string): boolean {
  if (!/\/revisions\/[^/]+\/meshes\//.test(pathname)) return false
  try {
    return decodeURIComponent(pathname) !== ''
  } catch {
    return false
  }
}

/** Puts the security fields on every page. The API answers data, and has its own. */
export function proxy(request: NextRequest): Response | Promise<Response> {
  if (request.nextUrl.pathname.startsWith('/api/')) return isMeshPath(request.nextUrl.pathname) ? NextResponse.next() : notFound(request)
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64')
  const content = policy(nonce)
  const headers = new Headers(request.headers)
  // Next reads the nonce from the request's own policy and puts it on the scripts that it writes.
  headers.set('content-security-policy', content)
  headers.set('x-nonce', nonce)
  // Read by the pages that lead to sign-in and back.
  headers.set('x-elbowroom-path', request.nextUrl.pathname + request.nextUrl.search)
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('Content-Security-Policy', content)
  response.headers.set('X-Content-Type-Options', 'nosniff')
  response.headers.set('X-Frame-Options', 'DENY')
  response.headers.set('Referrer-Policy', 'strict-origin-when-cross-origin')
  response.headers.set('Cross-Origin-Opener-Policy', 'same-origin')
  response.headers.set('Permissions-Policy', 'camera=(), microphone=(), geolocation=(), payment=(), usb=(), serial=(), hid=()')
  if (isServedByTls()) response.headers.set('Strict-Transport-Security', 'max-age=31536000')
  return response
}

export const config = {
  matcher: [
    '/((?!api/|_next/static|_next/image|icon.svg|favicon.ico).*)',
    // Of the API only what holds an escape that is no ASCII character. No name but a mesh's has one, and the framework answers 500
    // to those that are not UTF-8.
    '/api/v1/((?:.*)%(?![0-7][0-9A-Fa-f]).*)',
  ],
}
