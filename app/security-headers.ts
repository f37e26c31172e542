import type { RequestFacts } from './request-context.server.ts'

/** For answers that came over TLS. */
export const strictTransport = { 'Strict-Transport-Security': 'max-age=31536000; includeSubDomains' }

/** What every answer says unless it says otherwise itself: scripts by nonce, nothing from other hosts, nothing kept. */
export function securityHeaders({ nonce, requestId }: RequestFacts) {
  const policy = [
    `default-src 'none'`,
    `script-src 'nonce-${nonce}' 'strict-dynamic' 'wasm-unsafe-eval'`,
    `style-src 'self' 'nonce-${nonce}'`,
    `font-src 'self'; img-src 'self' blob:; connect-src 'self'; worker-src 'self'; manifest-src 'self'`,
    `form-action 'self'; base-uri 'none'; frame-ancestors 'none'; object-src 'none'`,
  ]
  return {
    'Content-Security-Policy': policy.join('; '),
    'Cache-Control': 'no-store',
    'Cross-Origin-Opener-Policy': 'same-origin',
    'Cross-Origin-Resource-Policy': 'same-origin',
    'Permissions-Policy': 'camera=(self), geolocation=(), microphone=()',
    // Not 'no-referrer': a form sent without scripts would say 'Origin: null', and React Router refuses that.
    'Referrer-Policy': 'same-origin',
    'X-Content-Type-Options': 'nosniff',
    'X-Request-Id': requestId,
  }
}
