import { numberSetting } from '../policy.ts'

export const coughFlowMouth = numberSetting({
  name: 'cough-flow-mouth',
  label: 'Cough is strong enough for removal, at mouth or mask, above',
  unit: 'L/min',
  default: 160,
  min: 100,
  max: 270,
  affects: 'Cough strength, and the weaning plan: whether the criterion is met.',
  source: { says: 'Winck 2015: above 160 L/min measured at the mouth', standing: 'published' },
})

export const coughFlowValve = numberSetting({
  name: 'cough-flow-valve',
  label: 'Cough is strong enough for removal, through tube and one-way valve, above',
  unit: 'L/min',
  default: 100,
  min: 60,
  max: 200,
  affects: 'Cough strength, and the weaning plan: whether the criterion is met.',
  source: { says: 'Study of 2024: above 100 L/min, 105 removals, 2 failed within 48 hours', standing: 'published' },
})

export const coughFlowTube = numberSetting({
  name: 'cough-flow-tube',
  label: 'Expiratory flow is strong enough for removal, at the tube, above',
  unit: 'L/min',
  default: 60,
  min: 30,
  max: 160,
  affects: 'Cough strength, and the weaning plan: whether the criterion is met.',
  source: {
    says: 'Winck 2015: above 60 L/min at the tube is expiratory flow, not a true cough',
    standing: 'published',
  },
})

export const coughFlowRetention = numberSetting({
  name: 'cough-flow-retention',
  label: 'Below this flow at the mouth secretions may be kept back',
  unit: 'L/min',
  default: 270,
  min: 160,
  max: 360,
  affects: 'Cough strength: a note to plan help with coughing.',
  source: { says: 'Review of 2022: below 270 L/min risk of retained secretions and infection', standing: 'published' },
})

export const coughSettings = [coughFlowMouth, coughFlowValve, coughFlowTube, coughFlowRetention]
