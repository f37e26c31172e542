import type { Request, RequestHandler } from 'express'

const MOST_BODY_BYTES = 64 * 1024 // the longest form has about 4 kB
// Far more than is kept of an upload: what is too large is read and let go, so that it can be said at its field (`multipartForm`).
const MOST_UPLOAD_BYTES = 256 * 1024 * 1024
const UPLOADS = /^\/(patients\/[\w-]+\/chart\/[\w-]+|entries\/[\w-]+\/correct|catalogue\/import)(\.data)?$/
const LONGEST_BODY_MS = 15_000

/** How long an upload may take to arrive: four photographs of 8 MB over 1.5 Mbit/s, as in a far corner of a ward. */
export const LONGEST_UPLOAD_MS = 180_000

const isUpload = (request: Request): boolean =>
  request.is('multipart/form-data') !== false && UPLOADS.test(request.path)

/** Ends a connection whose body has not arrived in time: only an upload may take as long as the server lets a request take. */
export function bodyInTime(...[request, response, next]: Parameters<RequestHandler>) {
  if (!isUpload(request)) {
    const late = setTimeout(() => {
      if (request.complete) return
      if (response.headersSent) return void request.destroy()
      response.set('Connection', 'close').status(408).type('text').send('Sent too slowly. Nothing was charted.')
      response.once('finish', () => request.destroy())
    }, LONGEST_BODY_MS)
    // Not with the answer: after one that came early, as to a stranger, the body goes on arriving.
    request.once('close', () => clearTimeout(late))
  }
  next()
}

/** Refuses a body past the limit, by what it says of itself and, where it says nothing, by counting as it arrives. */
export function bodyLimited(...[request, response, next]: Parameters<RequestHandler>) {
  const refuse = () => {
    if (response.headersSent) return
    // The rest of the body is still on its way: a connection kept open would take it for the next request.
    response.set('Connection', 'close').status(413).type('text').send('The form is too long. Nothing was charted.')
    response.once('finish', () => request.destroy())
  }
  const most = isUpload(request) ? MOST_UPLOAD_BYTES : MOST_BODY_BYTES
  if (Number(request.headers['content-length'] ?? 0) > most) return refuse()
  let bytes = 0
  request.on('data', (chunk: Buffer) => {
    bytes += chunk.length
    if (bytes > most) refuse()
  })
  request.pause() // counting must not start the flow before a route reads
  next()
}
