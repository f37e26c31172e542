import { expect, test } from 'vitest'
import { clearedBlock } from '#app/care/adverse-event/examples.ts'
import { adverseEvents } from '#app/care/adverse-event/schema.ts'
import { wholeKit } from '#app/care/bedside-kit/examples.ts'
import { bedsideKit } from '#app/care/bedside-kit/kind.ts'
import { kitChecks } from '#app/care/bedside-kit/schema.ts'
import type { StoredEntry } from '#app/care/kind.ts'
import { type AboutContext, aContext, anEntry, aTube, at, windowOf } from '#app/care/make.ts'
import { transfers } from '#app/care/transfer-checklist/schema.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'

/*
 * When the emergency equipment is checked: every shift, on transfer, on return and after use is common practice, without one
 * published source. That it is ready before the handover and that the patient is not left without it: NHS Greater Glasgow and
 * Clyde, essential equipment. That it stays with the patient at all times: St George's NHS. The half hour is a product proposal.
 */

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const arrived = (place: string) =>
  anEntry(transfers, '11:00', { moment: 'arrived', place, complete: 'yes', handedTo: 'T. Okafor' })
const dueAt = (entries: readonly StoredEntry[], about: AboutContext = {}) =>
  windowOf(bedsideKit, 'bedside-kit-check', aContext([tube, ...entries], '12:00', about)).dueAt
const checked = anEntry(kitChecks, '09:00', wholeKit)

test.each<[string, readonly StoredEntry[], AboutContext, string]>([
  ['every shift: not yet in this one', [anEntry(kitChecks, '06:00', wholeKit)], {}, '15:00'],
  ['every shift: in this one', [checked], {}, '23:00'],
  ['on transfer, to another ward', [checked], { moves: [{ at: at('11:00'), bed: 'B2', ward: 'Birch ward' }] }, '11:30'],
  ['on transfer, to another bed', [checked], { moves: [{ at: at('11:00'), bed: 'A4', ward: null }] }, '11:30'],
  ['on transfer, as charted', [checked, arrived('Birch ward')], {}, '11:30'],
  ['on return', [checked, arrived('Own bed, from imaging')], {}, '11:30'],
  ['after use', [checked, anEntry(adverseEvents, '11:00', clearedBlock)], {}, '11:30'],
  ['after a tube change', [checked, anEntry(tubeChanges, '11:00', aTube())], {}, '11:30'],
])('the kit is checked %s', (_, entries, about, due) => {
  expect(dueAt(entries, about)).toEqual(at(due))
})
