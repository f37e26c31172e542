import { numberSetting } from '../policy.ts'

const GEORGES = "St George's NHS, tracheostomy guidelines, humidification"

export const hmeInterval = numberSetting({
  name: 'hme-change-interval',
  label: 'Heat and moisture exchanger changed every',
  unit: 'h',
  default: 24,
  min: 4,
  max: 48,
  personal: true,
  affects: 'HME change: when the next one is due, while an exchanger is on.',
  source: { says: `${GEORGES}: every 24 hours, sooner if contaminated`, standing: 'published' },
})

export const waterInterval = numberSetting({
  name: 'humidifier-water-interval',
  label: 'Water of a heated humidifier looked at every',
  unit: 'h',
  default: 4,
  min: 1,
  max: 12,
  affects: 'Heated water check: when the next one is due, while a heated humidifier is on.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const THICK_SOURCE = `${GEORGES}: saline nebulisers for thick secretions, a heated humidifier for difficult ones`

export const humidificationSettings = [hmeInterval, waterInterval]
