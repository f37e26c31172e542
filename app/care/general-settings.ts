import { numberSetting } from './policy.ts'
import { signingSettings } from './signing-settings.ts'
import { supplySettings } from './supply-settings.ts'

/** Numbers that concern charting as a whole rather than one kind of care. */
export const adultAge = numberSetting({
  name: 'adult-age',
  label: 'Rules for adults apply from the age of',
  unit: 'years',
  default: 16,
  min: 12,
  max: 21,
  adultsOnly: true,
  affects: 'All due care: nothing is computed for younger people without a rule set for children.',
  source: { says: 'Local cut-off; values for children differ', standing: 'product proposal' },
})

export const lateEntryAfter = numberSetting({
  name: 'late-entry-after',
  label: 'An entry counts as late when written more than',
  unit: 'min',
  default: 60,
  min: 15,
  max: 240,
  affects: 'Timeline: the mark "late entry".',
  source: {
    says: 'NMC Code section 10 and US payer guides ask to say when written later; neither gives a number',
    standing: 'product proposal',
  },
})

export const lateReasonAfter = numberSetting({
  name: 'late-entry-reason-after',
  label: 'A late entry needs a reason when written more than',
  unit: 'h',
  default: 24,
  min: 4,
  max: 72,
  affects: 'Charting: a reason is asked for.',
  source: { says: 'US payer guides: a delayed entry needs its reason; no number given', standing: 'product proposal' },
})

export const generalSettings = [adultAge, lateEntryAfter, lateReasonAfter, ...signingSettings, ...supplySettings]
