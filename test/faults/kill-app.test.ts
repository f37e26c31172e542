import { afterAll, beforeAll, test } from 'vitest'
import { type StartedApp, startedApp } from '#test/journeys/app.ts'
import { killedWhileCharting } from './killed-while-charting.ts'

let app: StartedApp

beforeAll(async () => {
  app = await startedApp()
})

afterAll(() => app.stop())

test('the application is killed four times while six people chart: all that was acknowledged is there, once', async () => {
  await killedWhileCharting(app, app)
})
