import { afterAll, beforeAll, expect, test } from 'vitest'
import { type StartedApp, startedApp } from '#test/journeys/app.ts'
import {
  acknowledges,
  type BedsideClient,
  bedsideClient,
  entryCount,
  patientIdsOn,
  timesCharted,
} from './bedside-client.ts'

let app: StartedApp
let nurse: BedsideClient
let patientId: string

beforeAll(async () => {
  app = await startedApp()
  nurse = await bedsideClient(app, 'nurse.alder')
  patientId = (await patientIdsOn(app, 'Alder ward'))[0] ?? ''
})

afterAll(() => app.stop())

test('one form sent twenty times at once is acknowledged each time, and charted once', async () => {
  const before = await entryCount(app)
  const form = nurse.pressureForm(patientId, 25)
  const answers = await Promise.all(Array.from({ length: 20 }, () => nurse.send(form)))
  expect(answers.filter(answer => !acknowledges(answer, form))).toEqual([])
  expect(await timesCharted(app, [form.id])).toEqual(new Map([[form.id, 1]]))
  expect(await entryCount(app)).toBe(before + 1)
})

test('a form sent again much later, by hand or by a browser that goes back, is still the same act', async () => {
  const form = nurse.pressureForm(patientId, 24)
  expect(acknowledges(await nurse.send(form), form)).toBe(true)
  expect(acknowledges(await nurse.send(nurse.pressureForm(patientId, 23)), form)).toBe(false)
  expect(acknowledges(await nurse.send(form), form)).toBe(true)
  expect(await timesCharted(app, [form.id])).toEqual(new Map([[form.id, 1]]))
})

test('a used form with other answers is refused, and changes nothing', async () => {
  const form = nurse.pressureForm(patientId, 22)
  await nurse.send(form)
  const before = await entryCount(app)
  const changed = new URLSearchParams(form.body)
  changed.set('care.found', '27')
  const answer = await nurse.send({ ...form, body: changed })
  expect(answer.status).toBe(422)
  expect(await answer.text()).toContain('This form was charted before, with other answers.')
  expect(await entryCount(app)).toBe(before)
})

test('the same care charted by two people at once is two entries: both did it', async () => {
  const therapist = await bedsideClient(app, 'therapist.alder')
  const before = await entryCount(app)
  const [one, other] = [nurse.pressureForm(patientId, 26), therapist.pressureForm(patientId, 26)]
  const answers = await Promise.all([nurse.send(one), therapist.send(other)])
  expect(answers.map(({ status }) => status)).toEqual([302, 302])
  expect(await entryCount(app)).toBe(before + 2)
})

test('a form that another person opened is refused under this name', async () => {
  const therapist = await bedsideClient(app, 'therapist.alder')
  const before = await entryCount(app)
  const answer = await therapist.send(nurse.pressureForm(patientId, 26))
  expect(answer.status).toBe(409)
  expect(await entryCount(app)).toBe(before)
})
