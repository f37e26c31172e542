import { afterAll, beforeAll, expect, test } from 'vitest'
import { type StartedApp, startedApp } from '#test/journeys/app.ts'
import { until } from '../../database/run/processes.mjs'
import { bedsideClient, entryCount, patientIdsOn, timesCharted, writing } from './bedside-client.ts'
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
  const before = await entryCount(app)
  const patientIds = await patientIdsOn(app, 'Alder ward')
  const nurses = ['nurse.alder', 'nurse2.alder', 'nurse3.alder', 'nurse4.alder', 'nurse5.alder', 'therapist.alder']
  const clients = await Promise.all(nurses.map(who => bedsideClient(app, who)))
  const work = writing(clients, patientIds)
  for (let round = 1; round <= 4; round += 1) {
    const reached = work.acknowledged.size + 10
    expect(await until(() => work.acknowledged.size >= reached, 60_000)).toBe(true)
    await server.kill()
    await server.restart()
  }
  await work.finish()
  expect(work.repeated.size).toBeGreaterThan(0)
  const times = await timesCharted(app, [...work.acknowledged])
  expect([...work.acknowledged].filter(id => times.get(id) !== 1)).toEqual([])
  expect(await entryCount(app)).toBe(before + work.acknowledged.size)
  await app.verify()
})
