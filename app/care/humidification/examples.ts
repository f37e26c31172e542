import type { HumidificationData } from './schema.ts'

/** The most common look: an exchanger is on, and stays on. */
export const usualLook: HumidificationData = { method: 'hme', hmeChanged: 'no', consistency: 'thin' }

/** Looks at humidification as they are charted on a ward. */
export const humidificationExamples: readonly HumidificationData[] = [
  usualLook,
  { method: 'hme', hmeChanged: 'yes', consistency: 'thick', note: 'Wet through.' },
  { method: 'heated', waterLevel: 'filled', temperature: 37, consistency: 'moderate' },
  { method: 'heated', waterLevel: 'low' },
  { method: 'cold aerosol' },
  { method: 'nebuliser', consistency: 'tenacious' },
  { method: 'none' },
]
