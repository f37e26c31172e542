import './database/environment.ts'
import { randomBytes, randomUUID } from 'node:crypto'
import { once } from 'node:events'
import { readdirSync } from 'node:fs'
import { createServer } from 'node:http'
import { fileURLToPath } from 'node:url'
import { constants } from 'node:zlib'
import { createRequestHandler } from '@react-router/express'
import compression from 'compression'
import express, { type ErrorRequestHandler, type RequestHandler, type Response } from 'express'
import { RouterContextProvider, type ServerBuild } from 'react-router'
import type * as entry from './app/entry.server.tsx'
import { env } from './app/env.server.ts'
import { bodyInTime, bodyLimited, LONGEST_UPLOAD_MS } from './app/request-body.server.ts'
import type { RequestFacts } from './app/request-context.server.ts'
import { securityHeaders, strictTransport } from './app/security-headers.ts'

/** The address of a calendar is its password. */
const SECRET_IN_PATH = /^(\/calendar\/)[^/]+/
const DRAIN_MS = 2000 // npm start promises an end within three seconds, database included
const LONGEST_END_MS = 2400 // then npm start kills the process

const build: ServerBuild = await import(new URL('./build/server/index.js', import.meta.url).href)
// The build holds its own copy of every module: the keys and pools in use are those that its entry exports.
const { requestContext, beginShutdown, close } = build.entry.module as unknown as typeof entry
const clientFiles = fileURLToPath(new URL('./build/client/', import.meta.url))

const app = express()
app.disable('x-powered-by')
app.set('trust proxy', 'loopback')
app.use(identified, logged, headersSet, bodyInTime)
app.use(compression({ level: 1, brotli: { params: { [constants.BROTLI_PARAM_QUALITY]: 0 } } }))
app.use('/assets', express.static(`${clientFiles}assets`, { immutable: true, maxAge: '1y', index: false }), notFound)
app.use(openFiles(express.static(clientFiles, { maxAge: '1h', index: false, redirect: false })))
app.use(bodyLimited)
app.use(createRequestHandler({ build, getLoadContext: contextOf }))
app.use(failed)

const server = createServer(
  // The checker's default of 30 s would let slow senders hold connections far past these limits.
  // The time for a whole request is that of an upload; `bodyInTime` holds every other one to less.
  {
    headersTimeout: 8000,
    requestTimeout: LONGEST_UPLOAD_MS,
    connectionsCheckingInterval: 2000,
    keepAliveTimeout: 10_000,
  },
  app,
)
if (env.listens === 'when told') await once(process, 'message')
server.on('error', refusedToListen)
server.listen(env.port, env.host, () => {
  // From now on an error is one connection that could not be taken, as when too many are open, and no reason to end.
  server.off('error', refusedToListen).on('error', error => noteFailure(error))
  const address = server.address()
  process.send?.({ listening: typeof address === 'object' ? address?.port : env.port })
})

/** Asks the disk only for what lies beside the assets: every other address is a page's. */
function openFiles(files: RequestHandler): RequestHandler {
  const names = new Set(readdirSync(clientFiles))
  return (request, response, next) =>
    names.has(request.path.split('/')[1] ?? '') ? files(request, response, next) : next()
}

let stopping = false
for (const signal of ['SIGTERM', 'SIGINT', 'disconnect'] as const) process.on(signal, () => void stop(0))
// Node's own report would print a database error with its statement and values, and one forgotten promise would end all wards.
process.on('unhandledRejection', error => noteFailure(error))
process.on('uncaughtException', error => {
  noteFailure(error)
  void stop(1)
})

/** Takes no new request, lets those under way finish, then closes the application and ends the process. */
async function stop(code: number) {
  if (stopping) return
  stopping = true
  beginShutdown()
  // What still waits then, such as a statement on a hung disk, was acknowledged to nobody.
  setTimeout(() => process.exit(code), LONGEST_END_MS)
  const idle = setInterval(() => server.closeIdleConnections(), 50)
  const late = setTimeout(() => server.closeAllConnections(), DRAIN_MS)
  await new Promise(resolve => server.close(resolve))
  clearInterval(idle)
  clearTimeout(late)
  await close().catch(error => noteFailure(error))
  process.exit(code)
}

/** Name and code only: a message may quote a statement with names in it. */
function noteFailure(error: unknown, requestId?: string) {
  const { name, code } = error instanceof Error ? (error as NodeJS.ErrnoException) : { name: typeof error, code: null }
  console.error(JSON.stringify({ at: new Date().toISOString(), failed: name, code, requestId }))
}

function refusedToListen(error: NodeJS.ErrnoException) {
  const inUse = `Port ${env.port} is in use. Stop what uses it, or choose another: PORT=${env.port + 1} npm start`
  console.error(error.code === 'EADDRINUSE' ? inUse : `The server cannot listen on ${env.host}: ${error.message}`)
  process.exit(1)
}

function factsOf(response: Response): RequestFacts {
  return response.locals.facts
}

function identified(...[request, response, next]: Parameters<RequestHandler>) {
  const facts: RequestFacts = {
    address: request.ip ?? 'unknown',
    requestId: randomUUID(),
    nonce: randomBytes(16).toString('base64'),
    logged: {},
  }
  response.locals.facts = facts
  // Whatever the client sent under this name is replaced: it could be made to look like another request's.
  request.headers['x-request-id'] = facts.requestId
  next()
}

function contextOf(_request: unknown, response: Response) {
  const context = new RouterContextProvider()
  context.set(requestContext, factsOf(response))
  return context
}

function logged(...[request, response, next]: Parameters<RequestHandler>) {
  const startedAt = performance.now()
  const { method } = request
  const path = request.path.replace(SECRET_IN_PATH, '$1…')
  response.once('close', () => {
    if (path.startsWith('/assets/') && response.statusCode < 400) return
    const { requestId, logged: facts } = factsOf(response)
    const status = response.writableFinished ? response.statusCode : 499 // the client went away
    const ms = Math.round(performance.now() - startedAt)
    console.log(JSON.stringify({ at: new Date().toISOString(), requestId, method, path, status, ms, ...facts }))
  })
  next()
}

/** Sets what the answer itself has not set, at the last moment: files, pages and failures alike. */
function headersSet(...[request, response, next]: Parameters<RequestHandler>) {
  const defaults = { ...securityHeaders(factsOf(response)), ...(request.secure ? strictTransport : {}) }
  const writeHead = response.writeHead.bind(response)
  response.writeHead = ((...values: Parameters<typeof writeHead>) => {
    for (const [name, value] of Object.entries(defaults)) if (!response.hasHeader(name)) response.setHeader(name, value)
    return writeHead(...values)
  }) as typeof writeHead
  next()
}

function notFound(...[, response]: Parameters<RequestHandler>) {
  response.status(404).type('text').send('Not found')
}

function failed(...[error, , response, _next]: Parameters<ErrorRequestHandler>) {
  const { requestId } = factsOf(response)
  if (response.headersSent) return void response.destroy()
  const status = Number.isInteger(error?.status) && error.status >= 400 ? error.status : 500
  if (status >= 500) noteFailure(error, requestId)
  response.status(status).type('text').send(`This request failed. Reference: ${requestId}`)
}
