import { expect, test } from 'vitest'
import {
  assesses,
  competenceGaps,
  competenceReminders,
  monthsLater,
  type SignOff,
  signOffIn,
  standingIn,
} from './competence.ts'

const skill = 'tube change, performing'
const today = '2026-12-01'

function signOff(more: Partial<SignOff> = {}): SignOff {
  return {
    id: '1',
    userId: 'nurse',
    skill,
    level: 'independent',
    assessedOn: '2026-03-01',
    expiresOn: '2027-03-01',
    assessedById: 'educator',
    assessedByName: 'P. Okonhale',
    signedAt: new Date('2026-03-01T10:00:00.000Z'),
    withdrawn: null,
    ...more,
  }
}

const withdrawn = { by: 'P. Okonhale', at: new Date('2026-06-01T10:00:00.000Z'), reason: 'Signed for another person' }
const later = new Date('2026-09-01T10:00:00.000Z')

test.each<[string, readonly SignOff[], ReturnType<typeof standingIn>]>([
  ['nobody signed it off', [], 'missing'],
  ['another skill was', [signOff({ skill: 'suction' })], 'missing'],
  ['it was, to work alone', [signOff()], 'held'],
  ['it was, to assess others', [signOff({ level: 'assessor' })], 'held'],
  ['it was, under supervision', [signOff({ level: 'supervised' })], 'supervised'],
  ['it holds for the last day', [signOff({ expiresOn: today })], 'held'],
  ['it ran out yesterday', [signOff({ expiresOn: '2026-11-30' })], 'out of date'],
  ['it was withdrawn', [signOff({ withdrawn })], 'missing'],
  ['a later one is lower', [signOff(), signOff({ id: '2', level: 'supervised', signedAt: later })], 'supervised'],
  [
    'a later one was withdrawn',
    [signOff(), signOff({ id: '2', level: 'supervised', signedAt: later, withdrawn })],
    'held',
  ],
])('a skill stands as it should when %s', (_, signOffs, expected) => {
  expect(standingIn(signOffs, skill, today)).toBe(expected)
})

test('only an assessor whose own sign-off holds assesses, and only in that skill', () => {
  expect(assesses([signOff({ level: 'assessor' })], skill, today)).toBe(true)
  expect(assesses([signOff({ level: 'assessor' })], 'suction', today)).toBe(false)
  expect(assesses([signOff({ level: 'assessor', expiresOn: '2026-11-30' })], skill, today)).toBe(false)
  expect(assesses([signOff()], skill, today)).toBe(false)
})

test('gaps are listed by person and skill, and what runs out soon by its day', () => {
  const people = [{ id: 'nurse' }, { id: 'other' }, { id: 'new' }]
  const signOffs = [
    signOff({ expiresOn: '2026-12-31' }),
    signOff({ id: '2', userId: 'other', expiresOn: '2026-12-05' }),
    signOff({ id: '3', userId: 'other', skill: 'decannulation', expiresOn: '2026-01-05' }),
  ]
  const asked = [skill, 'decannulation'] as const
  const { gaps, expiring } = competenceGaps(people, signOffs, { today, noticeDays: 30, asked })
  expect(gaps.map(({ person, skill: lacks, standing }) => [person.id, lacks, standing])).toEqual([
    ['nurse', 'decannulation', 'missing'],
    ['other', 'decannulation', 'out of date'],
    ['new', skill, 'missing'],
    ['new', 'decannulation', 'missing'],
  ])
  expect(expiring.map(({ person, expiresOn }) => [person.id, expiresOn])).toEqual([
    ['other', '2026-12-05'],
    ['nurse', '2026-12-31'],
  ])
})

test.each([
  ['2026-12-01', 12, '2027-12-01'],
  ['2026-08-31', 6, '2027-02-28'],
  ['2028-02-29', 12, '2029-02-28'],
  ['2026-12-31', 1, '2027-01-31'],
])('%s and %i months give %s', (day, months, expected) => {
  expect(monthsLater(day, months)).toBe(expected)
})

test('there is no sign-off in a skill that nobody assessed', () => {
  expect(signOffIn([], skill)).toBeUndefined()
})

test.each<[string, readonly SignOff[], readonly string[]]>([
  ['never signed off', [], []],
  ['signed off for long', [signOff()], []],
  ['running out on the last day of notice', [signOff({ expiresOn: '2026-12-31' })], ['held 2026-12-31']],
  ['running out a day after that', [signOff({ expiresOn: '2027-01-01' })], []],
  ['running out today', [signOff({ expiresOn: today })], ['held 2026-12-01']],
  ['out of date', [signOff({ expiresOn: '2026-11-30' })], ['out of date 2026-11-30']],
  ['renewed in time', [signOff({ expiresOn: today }), signOff({ id: '2', signedAt: later })], []],
])('somebody %s is reminded of %j', (_, signOffs, expected) => {
  const about = { today, noticeDays: 30, asked: [skill] } as const
  const found = competenceReminders({ id: 'nurse' }, signOffs, about)
  expect(found.map(({ standing, expiresOn }) => `${standing} ${expiresOn}`)).toEqual(expected)
})
