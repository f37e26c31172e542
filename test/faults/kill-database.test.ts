import { afterAll, beforeAll, test } from 'vitest'
import { type StartedApp, startedApp } from '#test/journeys/app.ts'
import { killedWhileCharting } from './killed-while-charting.ts'
import { type OwnMariadb, ownMariadb } from './own-mariadb.ts'

let server: OwnMariadb
let app: StartedApp

beforeAll(async () => {
  server = await ownMariadb()
  app = await startedApp({ server })
})

afterAll(async () => {
  await app.stop()
  await server.remove()
})

test('the database is killed four times while six people chart: all that was acknowledged is there, once', async () => {
  await killedWhileCharting(app, server)
})
