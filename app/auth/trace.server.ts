import type { RouterContextProvider } from 'react-router'
import { requestContext } from '#app/request-context.server.ts'
import type { Trace } from '#database/access-log.server.ts'
import { userContext } from './signed-in.server.ts'

type Arrived = {
  readonly request: Request
  readonly url: URL
  readonly context: Readonly<RouterContextProvider>
}

/** What the access log says about a request: who, from where, to which path; never its search, which may hold names. */
export function traceOf({ request, url, context }: Arrived): Trace {
  const { address, requestId } = context.get(requestContext)
  return {
    actor: context.get(userContext),
    path: url.pathname,
    address,
    userAgent: request.headers.get('User-Agent'),
    requestId,
  }
}
