import { Agent, type IncomingMessage, request as send } from 'node:http'

/** One request, as a browser sends it. */
export interface Ask {
  readonly path: string
  readonly headers?: Readonly<Record<string, string>>
  /** Sent as a form by POST. */
  readonly form?: URLSearchParams
  readonly answered?: (answer: Answer) => void
}

export interface Answer {
  readonly status: number
  readonly headers: IncomingMessage['headers']
  /** As it came over the wire. */
  readonly bytes: number
}

const AT_ONCE = 4
const agent = new Agent({ keepAlive: true, maxSockets: AT_ONCE })
const usual = { 'Accept-Encoding': 'gzip, deflate, br', 'User-Agent': 'Mozilla/5.0 (bench)' }

/** Sends one request to a port of this machine and reads the whole answer. */
export function ask(port: number, { path, headers = {}, form }: Ask): Promise<Answer> {
  const body = form?.toString()
  const about =
    body === undefined ? {} : { 'Content-Type': 'application/x-www-form-urlencoded', 'Content-Length': body.length }
  const options = { host: '127.0.0.1', port, path, agent, method: body === undefined ? 'GET' : 'POST' }
  return new Promise((resolve, reject) => {
    const request = send({ ...options, headers: { ...usual, ...about, ...headers } }, response => {
      let bytes = 0
      response.on('data', (chunk: Buffer) => {
        bytes += chunk.length
      })
      response.on('end', () => resolve({ status: response.statusCode ?? 0, headers: response.headers, bytes }))
      response.on('error', reject)
    })
    request.on('error', reject)
    request.end(body)
  })
}

/**
 * Sends so many requests, four at a time, and returns the times they took in ms. Throws when more than four are not answered as
 * expected, which are those that may be under way while a board changes.
 */
export async function askMany(
  port: number,
  { count, status, next }: { count: number; status: number; next: () => Ask | Promise<Ask> },
): Promise<readonly number[]> {
  const times: number[] = []
  let [left, others] = [count, 0]
  const worker = async () => {
    while (left > 0) {
      left -= 1
      const asked = await next()
      const startedAt = performance.now()
      const answer = await ask(port, asked)
      times.push(performance.now() - startedAt)
      asked.answered?.(answer)
      if (answer.status !== status) others += 1
      if (others > AT_ONCE) throw new Error(`${asked.path} answered ${answer.status} instead of ${status}`)
    }
  }
  await Promise.all(Array.from({ length: AT_ONCE }, worker))
  return times
}
