const safeMethods = ['GET', 'HEAD', 'OPTIONS']

/** Whether a request may change something. */
export const isWrite = (request: Request): boolean => !safeMethods.includes(request.method)

/**
 * Whether a write may have been sent by a page of another site. A browser that names the relation is believed first,
 * because it sends `Origin: null` from our own forms when a page withholds its referrer. A request with neither is refused:
 * React Router's own check lets it through, and does not cover resource routes at all.
 */
export function isFromElsewhere(request: Request, ownOrigin: string): boolean {
  if (!isWrite(request)) return false
  const site = request.headers.get('Sec-Fetch-Site')
  const origin = request.headers.get('Origin')
  if (origin !== null && origin !== 'null' && origin !== ownOrigin) return true
  return site === null ? origin !== ownOrigin : site !== 'same-origin'
}

/**
 * Whether a person is behind a request, so that it keeps their session awake: a write, or a page they asked for.
 * Polls, live boards and a page that reloads itself are not (OWASP ASVS 5.0, 7.3.1), nor is the draft that the idle watch
 * sends on its own.
 */
export function isActivity(request: Request, path: string): boolean {
  if (isWrite(request)) return path !== '/draft'
  const destination = request.headers.get('Sec-Fetch-Dest')
  if (destination !== null) return destination === 'document' && request.headers.get('Sec-Fetch-User') === '?1'
  return request.headers.get('Accept')?.includes('text/html') ?? false
}
