import type { z } from 'zod'
import { bedsideKit } from '#app/care/bedside-kit/kind.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { humidification } from '#app/care/humidification/kind.ts'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import type { AnyCareKind, CareKind } from '#app/care/kind.ts'
import { observations } from '#app/care/observations/kind.ts'
import { oralCare } from '#app/care/oral-care/kind.ts'
import { stomaAndSkin } from '#app/care/stoma-and-skin/kind.ts'
import { suction } from '#app/care/suction/kind.ts'
import { weaningTrial } from '#app/care/weaning-trial/kind.ts'

/** What is charted: a kind of care with its answers. */
export interface Act {
  readonly kind: AnyCareKind
  readonly answers: Readonly<Record<string, unknown>>
}

/** An act whose answers fit the form of its kind. */
export function act<Slug extends string, Schema extends z.ZodObject>(
  kind: CareKind<Slug, Schema>,
  answers: z.output<Schema>,
): Act {
  return { kind, answers }
}

/** An act like another, with some answers of its own. */
export function like(one: Act, answers: Readonly<Record<string, unknown>>): Act {
  return { kind: one.kind, answers: { ...one.answers, ...answers } }
}

/** The rounds of a quiet day. */
export const wholeKit = act(bedsideKit, { complete: 'yes', suctionTested: 120, suctionUnit: 'mmHg' })
export const calm = act(observations, {
  ...{
    respiratoryRate: 16,
    spo2: 96,
    oxygen: 'stoma mask',
    fio2: 28,
    effort: 'easy',
    heartRate: 82,
    awareness: 'alert',
  },
})
export const calmNoFlags = like(calm, { redFlags: ['none'] })
export const noSuction = act(suction, { act: 'need only' })
export const mouth = act(oralCare, { care: ['looked', 'moistened'], seen: ['clean'] })
export const teeth = like(mouth, { care: ['looked', 'moistened', 'brushed'] })
export const pressure = act(cuffPressure, { found: 24, unit: 'cmH2O', method: 'manometer' })
export const hmeChanged = act(humidification, { method: 'hme', hmeChanged: 'yes', consistency: 'thin' })
export const hmeLeft = like(hmeChanged, { hmeChanged: 'no' })

/** The inner cannula, as lines and sizes go by the tube in place. */
const cannula = { line: 'Corvane Dual', locked: 'yes', spare: 'yes', tolerance: 'well' } as const
const first = { ...cannula, size: '8.0' }
const second = { ...cannula, size: '7.5' }
const third = { ...cannula, size: '7.0' }
export const inner = {
  seen8: act(innerCannula, { act: 'inspected', condition: 'clear', ...first }),
  new8: act(innerCannula, { act: 'replaced', condition: 'light', ...first }),
  blocked8: act(innerCannula, { act: 'replaced', condition: 'blocked', ...first }),
  seen75: act(innerCannula, { act: 'inspected', condition: 'clear', ...second }),
  clean75: act(innerCannula, { act: 'swapped', condition: 'light', other: 'ready', ...second }),
  seen7: act(innerCannula, { act: 'inspected', condition: 'clear', ...third }),
  clean7: act(innerCannula, { act: 'swapped', condition: 'light', other: 'ready', ...third }),
}

/** Opening, skin and ties: everything seen, nothing found. */
const everywhere = ['flange left', 'flange right', 'flange top', 'flange bottom', 'back of neck'] as const
export const skinSeen = act(stomaAndSkin, {
  ...{ appearance: ['clean'], exudate: 'none', bleeding: 'none', sites: [...everywhere], skin: 'intact' },
  ...{ dressing: 'left in place', sutures: 'none', ties: 'two', holderChanged: 'no' },
})
const fresh = { dressing: 'changed', holderChanged: 'yes', secondPerson: 'T. Okafor' }
export const redressed = like(skinSeen, fresh)
const sutured = { sutures: 'in place', sites: [...everywhere, 'under sutures'] }
export const suturedSeen = like(skinSeen, sutured)
export const suturedRedressed = like(redressed, sutured)
const injury = { skin: 'pressure injury', stage: 'stage-2', findingSite: 'flange bottom', sizeMm: 6 }
export const injurySeen = like(skinSeen, injury)
export const injuryRedressed = like(redressed, injury)

/** Trials begin suctioned, with somebody there, at 18 breaths, 97% and 80 beats; each is stopped as it was planned. */
export const cuffTrial = act(weaningTrial, {
  ...{ step: 'start', trial: 'cuff', cuffNow: 'down', airflow: 'yes', suctionFirst: 'yes', supervised: 'yes' },
  ...{ respiratoryRate: 18, spo2: 97, heartRate: 80 },
})
export const cuffTrialEnd = act(weaningTrial, {
  ...{ step: 'end', trial: 'cuff', cuffNow: 'down', reasons: ['planned'], afterwards: 'settled' },
})
