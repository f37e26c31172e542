import { Writable } from 'node:stream'
import { renderToPipeableStream } from 'react-dom/server'
import {
  type EntryContext,
  type HandleErrorFunction,
  isRouteErrorResponse,
  type RouterContextProvider,
  ServerRouter,
} from 'react-router'
import { closePasswords } from '#app/auth/password.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { requestContext } from './request-context.server.ts'

export { requestContext } from './request-context.server.ts'
export { beginShutdown } from './shutdown.server.ts'

export const streamTimeout = 5000

/** Ends what the application keeps open: database connections and the threads that hash passwords. */
export async function close(): Promise<void> {
  await Promise.all([sequelize.close(), closePasswords()])
}

export default function respond(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  loadContext: RouterContextProvider,
): Promise<Response> {
  const { nonce } = loadContext.get(requestContext)
  const withNonce = nonce === undefined ? {} : { nonce }
  return new Promise((resolve, reject) => {
    let shellSent = false
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={routerContext} url={request.url} {...withNonce} />,
      {
        ...withNonce,
        onShellReady() {
          shellSent = true
          headers.set('Content-Type', 'text/html; charset=utf-8')
          pipe(whole(body => resolve(new Response(body, { headers, status }))))
        },
        onShellError: reject,
        onError(error) {
          // Before the shell is sent, the rejection carries the error to whoever answers.
          if (shellSent && !request.signal.aborted) logFailure(error, requestIdOf(loadContext))
        },
      },
    )
    // One second more than the data may take, so that the page can still say what did not come.
    setTimeout(() => abort(), streamTimeout + 1000).unref()
  })
}

export const handleError: HandleErrorFunction = (error, { request, context }) => {
  // What routes answer with on purpose, such as a 404, is in the request's own line.
  if (!request.signal.aborted && !isRouteErrorResponse(error)) logFailure(error, requestIdOf(context))
}

function requestIdOf(context: Readonly<RouterContextProvider>) {
  return context.get(requestContext).requestId
}

/** Name, code and place only: messages of database errors quote statements with names and clinical values in them. */
function logFailure(error: unknown, requestId: string) {
  const { name, code, place } = error instanceof Error ? traits(error) : { name: typeof error, code: null, place: [] }
  console.error(JSON.stringify({ at: new Date().toISOString(), failed: name, code, requestId, place }))
}

function traits(error: Error) {
  const cause = 'parent' in error && error.parent instanceof Error ? error.parent : error
  const code = 'code' in cause ? String(cause.code) : null
  const lines = error.stack?.split('\n').filter(line => /^\s+at /.test(line)) ?? []
  return { name: error.name, code, place: lines.slice(0, 5).map(line => line.trim()) }
}

/** Gathers a page, and hands it on in one piece: piece by piece it would be compressed and sent in a hundred. */
function whole(done: (body: Uint8Array<ArrayBuffer>) => void): Writable {
  const pieces: Buffer[] = []
  return new Writable({
    write(piece: Buffer, _encoding, next) {
      pieces.push(piece)
      next()
    },
    final(next) {
      done(Buffer.concat(pieces))
      next()
    },
  })
}
