import { expect } from 'vitest'
import type { StartedApp } from '#test/journeys/app.ts'
import { until } from '../../database/run/processes.mjs'
import { bedsideClient, entryCount, patientIdsOn, timesCharted, writing } from './bedside-client.ts'

const PEOPLE = ['nurse.alder', 'nurse2.alder', 'nurse3.alder', 'nurse4.alder', 'nurse5.alder', 'therapist.alder']

/** Six people chart while something is killed and started again four times: all that was acknowledged is there, once. */
export async function killedWhileCharting(
  app: StartedApp,
  killed: Pick<StartedApp, 'kill' | 'restart'>,
): Promise<void> {
  const before = await entryCount(app)
  const patientIds = await patientIdsOn(app, 'Alder ward')
  const clients = await Promise.all(PEOPLE.map(who => bedsideClient(app, who)))
  const work = writing(clients, patientIds)
  for (let round = 1; round <= 4; round += 1) {
    const reached = work.acknowledged.size + 10
    expect(await until(() => work.acknowledged.size >= reached, 60_000)).toBe(true)
    await killed.kill()
    await killed.restart()
  }
  await work.finish()
  expect(work.repeated.size).toBeGreaterThan(0)
  const times = await timesCharted(app, [...work.acknowledged])
  expect([...work.acknowledged].filter(id => times.get(id) !== 1)).toEqual([])
  expect(await entryCount(app)).toBe(before + work.acknowledged.size)
  await app.verify()
}
