import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { parseWithZod } from '@conform-to/zod/v4'
import { describe, expect, test } from 'vitest'
import { z } from 'zod'
import { fieldsOf } from './field.ts'
import { type AnyCareKind, wordsOf } from './kind.ts'
import { careKinds, careSettings, careTasks, findKind } from './kinds.ts'
import { aContext, anEntry } from './make.ts'
import { readPayload, versionOf } from './payload.ts'
import { LOCAL_PLAN } from './warning.ts'

const kinds: readonly AnyCareKind[] = careKinds
const here = new URL('.', import.meta.url)
const repeated = (names: readonly string[]) => names.filter((name, i) => names.indexOf(name) !== i)

const NAME = /^[a-z][a-z0-9]*(-[a-z0-9]+)*$/

test('every folder of care is on the list of kinds, and every kind has its folder', () => {
  const folders = readdirSync(here, { withFileTypes: true }).filter(entry => entry.isDirectory())
  expect(folders.map(folder => folder.name).toSorted()).toEqual(kinds.map(kind => kind.slug).toSorted())
})

test('slugs, titles and buttons are unique, so that no two kinds can be taken for each other', () => {
  expect(repeated(kinds.map(kind => kind.slug))).toEqual([])
  expect(repeated(kinds.map(kind => kind.title))).toEqual([])
  expect(repeated(kinds.map(kind => kind.chartWords))).toEqual([])
})

test('a kind is found by its slug, and nothing by another', () => {
  for (const kind of kinds) expect(findKind(kind.slug)).toBe(kind)
  expect(findKind('constructor')).toBeUndefined()
})

/** The example as the chart form would post it: one text for each answer, several of one name for several options. */
function asForm(kind: AnyCareKind, example: Readonly<Record<string, unknown>>): FormData {
  const form = new FormData()
  for (const { name } of fieldsOf(kind.schema)) {
    const value = example[name]
    const answers: readonly unknown[] = Array.isArray(value) ? value : value === undefined ? [''] : [value]
    for (const answer of answers) form.append(`care.${name}`, String(answer))
  }
  return form
}

describe.each(kinds.map(kind => [kind.slug, kind] as const))('%s', (slug, kind) => {
  const examples: readonly Record<string, unknown>[] = kind.examples

  test('has a slug that is short and fit for an address', () => {
    expect(slug).toMatch(NAME)
    expect(slug.length).toBeLessThanOrEqual(32)
  })

  test('has examples', () => {
    expect(examples.length).toBeGreaterThan(0)
  })

  test.each(examples)('takes an example through form, storage and reading to its sentence: %j', example => {
    const submission = parseWithZod(asForm(kind, example), { schema: z.object({ care: kind.schema }) })
    expect(submission.reply().error).toBeUndefined()
    const posted: unknown = submission.status === 'success' ? submission.value.care : undefined
    const stored: unknown = JSON.parse(JSON.stringify(posted))
    const payload = readPayload(kind, versionOf(kind), stored)
    expect(payload).toEqual({ ok: true, data: example })
    const sentence = kind.summary(payload.ok ? payload.data : undefined)
    expect(sentence).toMatch(/^[A-Z0-9].*\.$/s)
    expect(sentence).not.toMatch(/undefined|null|NaN|\[object|\s{2}|\.\./)
  })

  test.each(fieldsOf(kind.schema).map(field => [field.name, field] as const))(
    'says what to enter for %s',
    (_, field) => {
      const { meta } = field
      expect(meta.label).toMatch(/^[A-Z0-9].*[^.:]$/)
      if (meta.control === 'quantity') expect(Boolean(meta.unit) || Boolean(meta.unitField)).toBe(true)
      if ('options' in meta) {
        expect(Object.values(meta.options).every(label => label.trim() !== '')).toBe(true)
        expect(repeated(Object.values(meta.options))).toEqual([])
      }
    },
  )

  test('asks a question only after another field that is there and has such an answer', () => {
    const fields = new Map(fieldsOf(kind.schema).map(({ name, meta }) => [name, meta]))
    for (const { required, meta } of fieldsOf(kind.schema)) {
      if (!meta.when) continue
      const other = fields.get(meta.when.field)
      const options = other && 'options' in other ? Object.keys(other.options) : []
      expect(options).toEqual(expect.arrayContaining([...meta.when.is]))
      expect(required).toBe(false)
    }
  })

  test('takes its unit from a field that is there', () => {
    const names = fieldsOf(kind.schema).map(({ name }) => name)
    for (const { meta } of fieldsOf(kind.schema)) {
      if (meta.control === 'quantity' && meta.unitField !== undefined) expect(names).toContain(meta.unitField)
    }
  })

  test('refuses an answer that it does not know', () => {
    expect(kind.schema.safeParse({ ...examples[0], 'not-a-field': 'x' }).success).toBe(false)
  })

  test('keeps a stored payload of every former version, which it still reads', () => {
    for (let version = 1; version < versionOf(kind); version++) {
      const fixture = new URL(`${slug}/fixtures/v${version}.json`, here)
      expect(existsSync(fixture), `${slug}/fixtures/v${version}.json`).toBe(true)
      expect(readPayload(kind, version, JSON.parse(readFileSync(fixture, 'utf8')))).toMatchObject({ ok: true })
    }
  })

  test('has tasks that can be told apart, read their numbers from the policy and answer for an empty record', () => {
    for (const task of kind.tasks ?? []) {
      expect(task.name).toMatch(NAME)
      expect(wordsOf(task.name)).toMatch(/^[A-Z][A-Za-z]/)
      expect(careSettings).toEqual(expect.arrayContaining([...task.settings]))
      expect(task.says(aContext([], '12:00'))).toMatch(/^[A-Z].*\.$/s)
      expect(task.clock(aContext([], '12:00')).state).not.toBe('suspended')
    }
  })

  test('opens a form from a task only with answers that the form knows', () => {
    for (const [name, answer] of (kind.tasks ?? []).flatMap(task => Object.entries(task.opensWith ?? {}))) {
      const meta = fieldsOf(kind.schema).find(field => field.name === name)?.meta
      expect(meta && 'options' in meta ? Object.keys(meta.options) : []).toContain(answer)
    }
  })

  test.each(examples)('shows numbers, rows and words of an example in its trends: %j', example => {
    const before = aContext([], '12:00')
    for (const trend of kind.trends ?? []) {
      if (trend.shape === 'measure') {
        const { measure } = trend
        const { from, to } = measure.range(before.ward)
        expect(from).toBeLessThan(to)
        expect(measure.unit(before.ward)).not.toBe('')
        for (const { mark, value } of trend.reading(example, before)?.values ?? []) {
          expect(Object.keys(measure.marks)).toContain(mark)
          expect(measure.show(value, before.ward)).toMatch(/^\d/)
        }
      } else if (trend.shape === 'findings') {
        for (const { row, words } of trend.seen(example)) {
          expect(Object.keys(trend.rows)).toContain(row)
          expect(words).toMatch(/^[A-Z]/)
        }
      } else {
        const record = aContext([anEntry(kind, '11:00', example)], '12:00')
        const lengths = trend.lengths({ record: record.record, now: record.now, at: () => record })
        for (const { group } of lengths) expect(Object.keys(trend.groups)).toContain(group)
      }
    }
  })

  test.each(examples)('warns with an action, a cause and a source, and red with the local plan: %j', example => {
    const before = aContext([], '12:00')
    const after = aContext([anEntry(kind, '11:00', example)], '12:00')
    for (const warning of [...(kind.warnings?.(example, before) ?? []), ...(kind.standing?.(after) ?? [])]) {
      expect(warning.name).toMatch(NAME)
      expect(warning.action).toMatch(/^[A-Z].*\.$/s)
      expect(warning.cause).toMatch(/^[A-Z0-9].*\.$/s)
      expect(warning.source).not.toBe('')
      expect(`${warning.action} ${warning.cause}`).not.toMatch(/undefined|NaN|!|≥|≤/)
      expect(warning.action.endsWith(LOCAL_PLAN)).toBe(warning.level === 'red')
    }
  })

  test('starts a form only with fields that it has', () => {
    const context = aContext([anEntry(kind, '11:00', examples[0] ?? {})], '12:00')
    const filled = { ...kind.startsWith?.(context), ...kind.usual?.(context)?.answers }
    const names = fieldsOf(kind.schema).map(({ name }) => name)
    expect(names).toEqual(expect.arrayContaining(Object.keys(filled)))
    for (const gauge of kind.gauges?.(context) ?? []) expect(names).toContain(gauge.field)
  })
})

test('no two tasks and no two settings share a name', () => {
  expect(repeated(careTasks.map(task => task.rule.name))).toEqual([])
  expect(repeated(careSettings.map(setting => setting.name))).toEqual([])
})

test.each(careSettings.map(setting => [setting.name, setting] as const))(
  'setting %s says what it is and whence',
  (name, setting) => {
    expect(name).toMatch(/^[a-z][a-z0-9-]{2,63}$/)
    expect(setting.label).toMatch(/^[A-Z]/)
    expect(setting.unit).not.toBe('')
    expect(setting.affects).toMatch(/\.$/)
    expect(setting.source.says.length).toBeGreaterThan(10)
    if (typeof setting.default === 'number') {
      const { min, max } = setting
      expect(min !== undefined && max !== undefined && min <= setting.default && setting.default <= max).toBe(true)
    } else {
      expect(setting.personal ?? false).toBe(false)
    }
  },
)
