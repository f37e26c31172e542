import { expect, test } from 'vitest'
import { aContext, anEntry, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualLook } from './examples.ts'
import { type HumidificationData, humidifications } from './schema.ts'
import { humidificationUse, plannedExchangers } from './supplies.ts'

test.each<[HumidificationData, number]>([
  [{ ...usualLook, hmeChanged: 'yes' }, 1],
  [usualLook, 0],
  [{ method: 'heated', waterLevel: 'filled' }, 0],
])('%j takes %i exchangers', (data, quantity) => {
  expect(humidificationUse(data)).toEqual(quantity === 0 ? [] : [{ item: { supply: 'exchanger' }, quantity }])
})

const plannedAfter = (...looks: readonly HumidificationData[]) => {
  const entries = looks.map((data, hour) => anEntry(humidifications, `0${hour + 1}:00`, data))
  const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
  return plannedExchangers(aContext([tube, ...entries], '12:00', { policy: { 'hme-change-interval': 12 } }))
}

test('exchangers are needed each interval, while one is on', () => {
  expect(plannedAfter(usualLook)).toEqual([{ item: { supply: 'exchanger' }, perDay: 2 }])
  expect(plannedAfter(usualLook, { method: 'nebuliser' })).toHaveLength(1)
  expect(plannedAfter(usualLook, { method: 'heated', waterLevel: 'low' })).toEqual([])
  expect(plannedAfter()).toEqual([])
})
