import type { z } from 'zod'
import { spo2Range } from '../../clinical/observations.ts'
import { careFields, choice, choices, note, quantity } from '../field.ts'
import { charted } from '../kind.ts'

export const oxygenDevices = {
  air: 'Air',
  'stoma mask': 'Tracheostomy mask',
  exchanger: 'Oxygen at the exchanger',
  't-piece': 'T-piece',
  'high flow': 'High flow',
  ventilator: 'Ventilator',
  other: 'Other',
} as const

export const efforts = {
  easy: 'Easy',
  increased: 'Harder than usual',
  distress: 'Distress',
  none: 'Not breathing',
} as const

export const awareness = {
  alert: 'Alert',
  confused: 'Newly confused',
  voice: 'Responds to voice',
  pain: 'Responds to pain',
  unresponsive: 'Unresponsive',
  sedated: 'Sedated on purpose',
} as const

/** What may sit on the end of the tube. */
export const onTubes = {
  nothing: 'Nothing, or an exchanger',
  valve: 'One-way valve',
  cap: 'Cap',
  circuit: 'Mask, circuit or ventilator',
} as const

/** Red flags worth a tick-list in each shift (NHS Wales, RCEM learning, a UK teaching hospital). */
export const redFlags = {
  none: 'None of these',
  noise: 'Noisy breathing or stridor',
  voice: 'Voice or bubbles with the cuff up',
  muscles: 'Breathing pauses, or muscles of the neck at work',
  secretions: 'Secretions that can be heard',
  air: 'Cuff needs more air than before',
  cannula: 'Inner cannula changed more often than before',
  moved: 'Tube displaced, or its mark at the flange moved',
  blood: 'Fresh blood',
  pulse: 'Tube moves with the pulse',
  swelling: 'New swelling of the neck, or air under the skin',
  pain: 'Pain at tube or neck',
  agitation: 'Agitation',
  worse: 'Worse than before, without a clear cause',
} as const
export type RedFlag = keyof typeof redFlags

const onOxygen = {
  when: { field: 'oxygen', is: ['stoma mask', 'exchanger', 't-piece', 'high flow', 'ventilator', 'other'] },
}

const fields = careFields({
  respiratoryRate: quantity({ label: 'Respiratory rate', unit: 'a min', min: 0, max: 70 }),
  spo2: quantity({ label: 'Oxygen saturation (SpO2)', unit: '%', ...spo2Range }),
  oxygen: choice({ label: 'Air or oxygen', options: oxygenDevices }),
  fio2: quantity({
    label: 'Share of oxygen (FiO2)',
    hint: 'In per cent: 40, not 0.4',
    unit: '%',
    min: 21,
    max: 100,
    ...onOxygen,
  }).optional(),
  flow: quantity({
    label: 'Oxygen flow',
    hint: 'Where FiO2 is not known',
    unit: 'L/min',
    min: 0,
    max: 60,
    step: 0.5,
    ...onOxygen,
  }).optional(),
  effort: choice({ label: 'Breathing', options: efforts }),
  heartRate: quantity({ label: 'Heart rate', unit: 'a min', min: 0, max: 250 }),
  awareness: choice({ label: 'Consciousness', options: awareness }),
  onTube: choice({ label: 'On the tube', options: onTubes }).optional(),
  redFlags: choices({ label: 'Red flags', hint: 'Looked for once in each shift', options: redFlags })
    .refine(chosen => chosen.length === 1 || !chosen.includes('none'), 'None of these does not go with another')
    .optional(),
  systolic: quantity({ label: 'Systolic blood pressure', unit: 'mmHg', min: 30, max: 300, more: true }).optional(),
  temperature: quantity({ label: 'Temperature', unit: '°C', min: 30, max: 43, step: 0.1, more: true }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

export type ObservationData = z.output<typeof fields>

/** A rate this low is believed only of somebody who does not breathe (product proposal). */
const LOWEST_RATE = 4

/** Observations: nothing in them is ever filled in ahead. FiO2 or flow is asked for with oxygen; answers that contradict are sent back. */
export const observationSchema = fields.superRefine((seen, context) => {
  for (const [field, message] of contradictions(seen)) {
    context.addIssue({ code: 'custom', path: [field], message })
  }
})

function contradictions(seen: ObservationData): readonly (readonly [keyof ObservationData, string])[] {
  const { respiratoryRate: rate, oxygen, fio2, flow, effort } = seen
  const apnoea = effort === 'none'
  return [
    ...(rate < LOWEST_RATE && !apnoea
      ? ([
          ['respiratoryRate', `Respiratory rate must be from ${LOWEST_RATE} to 70 a min, unless not breathing`],
        ] as const)
      : []),
    ...(rate >= LOWEST_RATE && apnoea && oxygen !== 'ventilator'
      ? ([['effort', 'Not breathing does not go with this respiratory rate']] as const)
      : []),
    ...(oxygen !== 'air' && fio2 === undefined && flow === undefined
      ? ([['fio2', 'Enter the share of oxygen (FiO2), or the oxygen flow']] as const)
      : []),
  ]
}

/** Observations: ask a record with this. */
export const observationSets = charted({ slug: 'observations', schema: observationSchema })
