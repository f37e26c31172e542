// The bare routes behind the server that the application has, without anything but the framework and compression.
import { constants } from 'node:zlib'
import { createRequestHandler } from '@react-router/express'
import compression from 'compression'
import express from 'express'
import type { ServerBuild } from 'react-router'

const build: ServerBuild = await import(new URL('../../../build/floor/server/index.js', import.meta.url).href)

const app = express()
app.disable('x-powered-by')
app.use(compression({ level: 1, brotli: { params: { [constants.BROTLI_PARAM_QUALITY]: 0 } } }))
app.use(createRequestHandler({ build }))
const server = app.listen(0, '127.0.0.1', () => {
  const address = server.address()
  process.send?.({ listening: typeof address === 'object' ? address?.port : 0 })
})
for (const signal of ['SIGTERM', 'disconnect'] as const) process.on(signal, () => process.exit(0))
