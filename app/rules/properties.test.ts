import fc from 'fast-check'
import { expect, test } from 'vitest'
import type { AnyCareKind, StoredEntry } from '../care/kind.ts'
import { careKinds, careTasks } from '../care/kinds.ts'
import { aContext, anEntry, at } from '../care/make.ts'
import { hours, later, minutes } from '../time/duration.ts'
import { dueTasks } from './due-tasks.ts'
import { tubeCard } from './tube-card.ts'
import { careView } from './views.ts'
import { standingWarnings } from './warnings.ts'
import { whyDue } from './why.ts'

/** Any valid act of any kind, by the kinds' own examples, within the ten days before `now`. */
const now = at('2026-03-10 12:00')
const anAct = fc
  .record({ kind: fc.constantFrom(...(careKinds as readonly AnyCareKind[])), example: fc.nat(), back: fc.nat(14_400) })
  .map(({ kind, example, back }) => {
    const data = kind.examples[example % kind.examples.length]
    return anEntry(kind, later(now, minutes(-back)), data)
  })
const acts = fc.array(anAct, { maxLength: 40 })

const seen = (entries: readonly StoredEntry[], moment = now) => {
  const context = aContext(entries, moment)
  return {
    tasks: dueTasks(context).map(({ rule, status, window }) => ({ name: rule.name, status, window })),
    warnings: standingWarnings(context),
  }
}

test('the order in which entries are read is irrelevant', () => {
  fc.assert(
    fc.property(
      acts.chain(list => fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length }))),
      ([list, shuffled]) => {
        expect(seen(shuffled)).toEqual(seen(list))
      },
    ),
  )
})

test('an entry that arrives twice counts once', () => {
  fc.assert(
    fc.property(acts, list => {
      expect(seen([...list, ...list])).toEqual(seen(list))
    }),
  )
})

test('superseding an entry with the same content changes nothing that is due', () => {
  fc.assert(
    fc.property(acts, fc.nat(), (list, which) => {
      const entry = list[which % Math.max(1, list.length)]
      if (!entry) return
      const again: StoredEntry = { ...entry, id: `${entry.id}-again`, supersedesId: entry.id, reason: 'The same again' }
      const due = ({ tasks }: ReturnType<typeof seen>) => tasks
      expect(due(seen([...list, again]))).toEqual(due(seen(list)))
    }),
  )
})

test('rules never throw on any valid record, at any moment', () => {
  fc.assert(
    fc.property(acts, fc.integer({ min: -400, max: 2000 }), (list, ahead) => {
      const context = aContext(list, later(now, hours(ahead)))
      for (const task of dueTasks(context)) whyDue(task, context)
      standingWarnings(context)
      tubeCard(context)
      careView(context, at('2026-03-01 00:00'))
      for (const entry of list) {
        const kind = (careKinds as readonly AnyCareKind[]).find(({ slug }) => slug === entry.kind)
        kind?.warnings?.(entry.raw, context)
        kind?.usual?.(context)
        kind?.startsWith?.(context)
        kind?.gauges?.(context)
      }
    }),
  )
})

const examplesOf = (kind: AnyCareKind) => kind.examples.map((data, index) => [kind.slug, index, kind, data] as const)

/** Findings that ask for an earlier look (blocked, out of the band, copious, let down) are meant to bring it forward. */
const plain = careTasks
  .filter(({ kind }) => kind.tasks)
  .flatMap(({ kind, rule }) => examplesOf(kind).map(([, index, , data]) => ({ kind, rule, index, data })))

test.each(plain)(
  'charting $kind.slug example $index now never makes $rule.name due sooner without saying why',
  ({ kind, rule, data }) => {
    fc.assert(
      fc.property(acts, list => {
        const before = rule.clock(aContext(list, now))
        const after = rule.clock(aContext([...list, anEntry(kind, now, data)], now))
        if (before.state !== 'running' || after.state !== 'running') return
        const isSooner = after.window.dueAt < before.window.dueAt
        expect(isSooner && after.because === undefined).toBe(false)
      }),
      { numRuns: 40 },
    )
  },
)
