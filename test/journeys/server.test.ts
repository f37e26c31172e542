import { connect } from 'node:net'
import { text } from 'node:stream/consumers'
import { setTimeout as pause } from 'node:timers/promises'
import { beforeAll, expect, test } from 'vitest'
import { connection } from '#database/connection.server.ts'
import { type StartedApp, startedApp } from './app.ts'

let app: StartedApp

beforeAll(async () => {
  app = await startedApp({ demo: false })
  return app.stop
})

test.each([
  ['a data answer', '/health'],
  ['a file', '/favicon.svg'],
  ['a missing asset', '/assets/none.js'],
  ['a missing page', '/none'],
])('the security headers are on %s', async (_what, path) => {
  const { headers } = await fetch(app.url + path)
  expect(Object.fromEntries(headers)).toMatchObject({
    'content-security-policy': expect.stringMatching(
      /script-src 'nonce-[\w+/=]{24}' 'strict-dynamic'.*frame-ancestors 'none'/,
    ),
    'cross-origin-opener-policy': 'same-origin',
    'referrer-policy': 'same-origin',
    'x-content-type-options': 'nosniff',
  })
  expect(headers.has('x-powered-by')).toBe(false)
})

test('a page is stored nowhere, and a hashed asset for a year', async () => {
  const page = await fetch(`${app.url}/none`)
  expect(page.headers.get('cache-control')).toBe('no-store')
  const [, asset] =
    (await page.text()).match(/src="(\/assets\/[^"]+)"|href="(\/assets\/[^"]+\.js)"/)?.filter(Boolean) ?? []
  const file = await fetch(app.url + asset)
  expect(file.headers.get('cache-control')).toBe('public, max-age=31536000, immutable')
})

test('each answer has a nonce of its own', async () => {
  const policies = await Promise.all(
    [1, 2].map(async () => (await fetch(`${app.url}/health`)).headers.get('content-security-policy')),
  )
  expect(policies[0]).not.toBe(policies[1])
})

test('a form that says it is longer than 64 kB is refused, and the next one is not', async () => {
  const long = await fetch(`${app.url}/health`, {
    method: 'POST',
    body: new URLSearchParams({ note: 'a'.repeat(70_000) }),
  })
  expect(long.status).toBe(413)
  expect(long.headers.get('connection')).toBe('close')
  expect((await fetch(`${app.url}/health`)).status).toBe(200)
})

test('a form that does not say its length is counted', async () => {
  const body = new ReadableStream({
    start(controller) {
      for (let part = 0; part < 20; part += 1) controller.enqueue(new TextEncoder().encode('a'.repeat(4096)))
      controller.close()
    },
  })
  const headers = { Origin: app.url, 'Content-Type': 'application/x-www-form-urlencoded' }
  const answer = await fetch(`${app.url}/sign-in`, { method: 'POST', headers, body, duplex: 'half' } as RequestInit)
  expect(answer.status).toBe(413)
})

test('a request that never ends its headers is dropped', { timeout: 20_000 }, async () => {
  const { hostname, port } = new URL(app.url)
  const socket = connect(Number(port), hostname)
  socket.write('GET / HTTP/1.1\r\nHost: x\r\n')
  expect(await text(socket)).toContain('408 Request Timeout')
})

/** A form whose body comes a byte at a time, and everything that is answered until the connection ends. */
async function trickled(origin: string): Promise<string> {
  const { hostname, port, host } = new URL(app.url)
  const socket = connect(Number(port), hostname)
  socket.on('error', () => {}) // cut off in the middle of a byte: what came before it counts
  socket.write(
    `POST /sign-in HTTP/1.1\r\nHost: ${host}\r\nOrigin: ${origin}\r\nContent-Type: application/x-www-form-urlencoded\r\nContent-Length: 5000\r\n\r\n`,
  )
  const drip = setInterval(() => socket.write('a'), 300)
  const answer: Buffer[] = []
  socket.on('data', chunk => answer.push(chunk))
  await new Promise(resolve => socket.once('close', resolve))
  clearInterval(drip)
  return Buffer.concat(answer).toString()
}

test('forms that trickle are ended, those that were refused at once too, and keep nobody else waiting', async () => {
  let [ended, answered] = [false, 0]
  const origins = Array.from({ length: 30 }, (_, i) => (i % 2 === 0 ? app.url : 'http://elsewhere.example'))
  const slow = Promise.all(origins.map(trickled)).finally(() => {
    ended = true
  })
  while (!ended) {
    expect((await fetch(`${app.url}/sign-in`)).status).toBe(200)
    answered += 1
    await pause(500)
  }
  expect(answered).toBeGreaterThan(5)
  for (const [i, answer] of (await slow).entries()) {
    if (i % 2 === 0) expect(answer).toContain('Sent too slowly. Nothing was charted.')
    expect(answer).toMatch(i % 2 === 0 ? /^HTTP\/1\.1 408 / : /^HTTP\/1\.1 400 /)
  }
})

test('a line of the log names neither the query nor what the client calls the request', async () => {
  await fetch(`${app.url}/none?name=Margaret`, { headers: { 'X-Request-Id': 'forged' } })
  expect(app.log()).toContain('"path":"/none","status":404')
  expect(app.log()).not.toMatch(/Margaret|forged/)
})

test('readiness tells a missing migration from a database in order', async () => {
  expect((await fetch(`${app.url}/health/ready`)).status).toBe(200)
  const owner = connection(app.ownerUrl, { maxConnections: 1 })
  await owner.query(`INSERT INTO schema_migrations VALUES ('9999-from-a-newer-build')`)
  const behind = await fetch(`${app.url}/health/ready`)
  await owner.query(`DELETE FROM schema_migrations WHERE name LIKE '9999%'`)
  await owner.close()
  expect(behind.status).toBe(503)
  expect(await behind.json()).toEqual({ status: 'schema differs' })
})
