import { expect, test } from 'vitest'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import { aContext, anEntry, aTube, at } from '#app/care/make.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { tubeChangePlan } from '#app/care/tube-change-plan/kind.ts'
import { filledFrom } from './filled.ts'
import { type InHand, scanFindings, stops } from './findings.ts'
import { wantedBy } from './wanted.ts'

const fine: InHand = {
  of: 'inner cannula',
  name: 'Alder 8.0, disposable',
  expiresOn: '2026-03-10',
  retiredAt: null,
  recall: undefined,
  isUsed: false,
  wanted: { of: 'inner cannula', tube: 'Alder 8.0', fits: true },
}
const recall = { lot: '7B', line: null, reason: 'Leaks', recalledAt: at('09:00'), recalledByName: 'M. Osei' }
const names = (item: Partial<InHand>) =>
  scanFindings({ ...fine, ...item }, { today: '2026-03-10', zone: 'Europe/London' }).map(({ name }) => name)

test.each<[Partial<InHand>, readonly string[]]>([
  [{}, []],
  [{ expiresOn: null, wanted: null }, []],
  [{ expiresOn: '2026-03-09' }, ['expired']],
  [{ recall }, ['recalled']],
  [{ retiredAt: at('08:00') }, ['retired']],
  [{ of: 'tube' }, ['other-kind']],
  [{ wanted: { of: 'inner cannula', tube: 'Alder 8.0', fits: false } }, ['other-tube']],
  [
    { wanted: { of: 'inner cannula', tube: 'Alder 8.0', fits: false }, recall, expiresOn: '2026-01-01' },
    ['other-tube', 'recalled', 'expired'],
  ],
])('of %o the page says %j', (item, expected) => {
  expect(names(item)).toEqual(expected)
})

test('the wrong inner cannula is stopped in the words of the chart', () => {
  const wanted = { of: 'inner cannula', tube: 'Alder 8.0', fits: false } as const
  const found = scanFindings({ ...fine, wanted }, { today: '2026-03-10', zone: 'Europe/London' })
  expect(found).toMatchObject([
    {
      level: 'red',
      action:
        'This cannula is not made for this tube. Change it now for the matching one. Follow your local emergency plan.',
      cause: 'Scanned: Alder 8.0, disposable. The tube in place is Alder 8.0.',
    },
  ])
  expect(stops(found)).toBe(true)
})

test('one that is not bought any more does not stop', () => {
  const found = scanFindings({ ...fine, retiredAt: at('08:00') }, { today: '2026-03-10', zone: 'Europe/London' })
  expect(stops(found)).toBe(false)
})

test('of an item that was used nobody is told to take another one, and it still stops', () => {
  const used = { ...fine, isUsed: true, recall, expiresOn: '2026-01-01', retiredAt: at('08:00') }
  const found = scanFindings(used, { today: '2026-03-10', zone: 'Europe/London' })
  expect(found.map(({ name }) => name)).toEqual(['recalled', 'expired'])
  for (const { action } of found) expect(action).toMatch(/^If it is still in place, ask the tracheostomy team/)
  expect(stops(found)).toBe(true)
})

const tubeId = '019aa7c2-0000-7000-8000-000000000001'
const item = { id: '019aa7c2-0000-7000-8000-000000000002', line: 'Alder', size: '8.0', fits: [tubeId] }
const withTube = (more: Parameters<typeof aTube>[0]) => aContext([anEntry(tubeChange, '08:00', aTube(more))], '12:00')

test.each([
  [{ item: tubeId }, item, true],
  [{ item: tubeId, line: 'Corvane' }, item, true],
  [{ item: tubeId }, { ...item, fits: [] }, false],
  [{}, { ...item, fits: [] }, true],
  [{ size: '7.0' }, item, false],
])('in a tube %o the cannula %o fits: %s', (tube, cannula, fits) => {
  expect(wantedBy(innerCannula, withTube(tube), cannula)).toMatchObject({ of: 'inner cannula', fits })
})

test('a tube is not held against the one in place', () => {
  expect(wantedBy(tubeChange, withTube({}), item)).toEqual({ of: 'tube', tube: null, fits: true })
})

test('a form gets what it asks about, and what the item does not have is emptied', () => {
  const catalogued = { id: item.id, line: 'Alder', size: '8.0', gtin: '09521234543213', idWithInner: null, lineId: 'x' }
  const name = 'Alder 8.0 ISO 5366, dual'
  const scan = { item: catalogued, name, lot: '7B', expiresOn: null, codes: 'manual (01)09521234543213' }
  expect(filledFrom(innerCannula, { ...scan, of: 'inner cannula' })).toEqual({
    'care.line': ['Alder'],
    'care.size': ['8.0'],
    'care.lot': ['7B'],
    'care.expiresOn': [''],
    'care.item': [item.id],
    'care.scanned': ['manual (01)09521234543213'],
  })
  expect(filledFrom(tubeChange, { ...scan, of: 'tube' })).toMatchObject({ 'care.idWithInner': [''] })
  expect(filledFrom(tubeChange, { ...scan, of: 'inner cannula' })).toBeNull()
  expect(filledFrom(tubeChangePlan, { ...scan, of: 'tube' })).toEqual({
    'care.newTube': [name],
    'care.newItem': [item.id],
  })
})
