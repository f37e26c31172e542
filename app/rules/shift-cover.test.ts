import { expect, test } from 'vitest'
import { decannulation } from '../care/decannulation/kind.ts'
import { freeNote } from '../care/free-note/kind.ts'
import { at } from '../care/make.ts'
import { tubeChange } from '../care/tube-change/kind.ts'
import type { SignOff } from './competence.ts'
import { shiftGaps, type Written } from './shift-cover.ts'

const ward = { shiftTimes: ['07:00', '19:00'], zone: 'Europe/London' }
const SKILL = 'tube change, performing'

const wrote = (userId: string, when: string, more: Partial<Written> = {}): Written => ({
  userId,
  at: at(when),
  kind: freeNote.slug,
  isAct: true,
  ...more,
})

const signedOff = (userId: string, more: Partial<SignOff> = {}): SignOff => ({
  id: `${userId}-1`,
  userId,
  skill: SKILL,
  level: 'independent',
  assessedOn: '2026-01-10',
  expiresOn: '2027-01-10',
  assessedById: 'educator',
  assessedByName: 'P. Okonhale',
  signedAt: at('2026-01-10 12:00'),
  withdrawn: null,
  ...more,
})

interface Given {
  readonly written: readonly Written[]
  readonly signOffs?: readonly SignOff[]
  readonly from?: string
  readonly now?: string
}

const gapsOf = ({ written, signOffs = [], from = '2026-03-08 00:00', now = '2026-03-10 12:00' }: Given) =>
  shiftGaps({ written, signOffs, ward, from: at(from), now: at(now), kinds: [tubeChange, freeNote] }).map(
    ({ shift, shifts, without, acts }) => `${shift}: ${without.length} of ${shifts}, ${acts} acts`,
  )

const night = '2026-03-08 23:00'

test.each<[string, Given, readonly string[]]>([
  ['nobody charted', { written: [] }, []],
  ['somebody in date charted', { written: [wrote('ama', night)], signOffs: [signedOff('ama')] }, []],
  ['nobody in date charted', { written: [wrote('ama', night)] }, ['Shift from 19:00: 1 of 1, 0 acts']],
  [
    'one of two was in date',
    { written: [wrote('ama', night), wrote('kofi', night)], signOffs: [signedOff('kofi')] },
    [],
  ],
  [
    'one of two nights was without',
    { written: [wrote('ama', night), wrote('kofi', '2026-03-09 23:00')], signOffs: [signedOff('kofi')] },
    ['Shift from 19:00: 1 of 2, 0 acts'],
  ],
  [
    'after midnight the shift is the one before',
    { written: [wrote('ama', '2026-03-09 06:59'), wrote('ama', '2026-03-09 07:00')] },
    ['Shift from 07:00: 1 of 1, 0 acts', 'Shift from 19:00: 1 of 1, 0 acts'],
  ],
  ['the shift of now is not over', { written: [wrote('ama', '2026-03-10 08:00')] }, []],
  ['the shift that had begun before is left out', { written: [wrote('ama', '2026-03-08 01:00')] }, []],
  [
    'a tube change in a shift without is counted, its correction is not',
    {
      written: [
        wrote('ama', night, { kind: tubeChange.slug }),
        wrote('ama', night, { kind: tubeChange.slug, isAct: false }),
      ],
    },
    ['Shift from 19:00: 1 of 1, 1 acts'],
  ],
])('%s', (_, given, expected) => {
  expect(gapsOf(given)).toEqual(expected)
})

test.each<[string, Partial<SignOff>, number]>([
  ['in date on its last day', { expiresOn: '2026-03-08' }, 0],
  ['out of date the day before', { expiresOn: '2026-03-07' }, 1],
  ['under supervision only', { level: 'supervised' }, 1],
  ['of another skill', { skill: 'decannulation' }, 1],
  ['signed off only after the shift', { signedAt: at('2026-03-09 07:00') }, 1],
  ['signed off before the shift was over', { signedAt: at('2026-03-09 06:59') }, 0],
  ['withdrawn', { withdrawn: { by: 'P. Okonhale', at: at('2026-03-09 12:00'), reason: 'Mistaken' } }, 1],
])('a sign-off %s leaves %s nights without', (_, about, count) => {
  expect(gapsOf({ written: [wrote('ama', night)], signOffs: [signedOff('ama', about)] })).toHaveLength(count)
})

test('the days and the skill of each gap are named', () => {
  const written = [wrote('ama', night), wrote('ama', '2026-03-10 02:00')]
  const asked = { written, ward, from: at('2026-03-08 00:00'), now: at('2026-03-10 12:00') }
  const gaps = shiftGaps({ ...asked, signOffs: [signedOff('ama')], kinds: [tubeChange, decannulation] })
  expect(gaps).toEqual([
    {
      shift: 'Shift from 19:00',
      skill: 'decannulation',
      shifts: 2,
      without: ['2026-03-08', '2026-03-09'],
      acts: 0,
    },
  ])
})
