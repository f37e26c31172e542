import type { InnerCannulaData } from './schema.ts'

/** A disposable inner cannula replaced at a plain check: the case that other examples vary. */
export const replacedWithNew: InnerCannulaData = {
  act: 'replaced',
  condition: 'light',
  line: 'Corvane Dual',
  size: '8.0',
  locked: 'yes',
  spare: 'yes',
  tolerance: 'well',
}

export const innerCannulaExamples: readonly InnerCannulaData[] = [
  replacedWithNew,
  {
    act: 'inspected',
    condition: 'clear',
    line: 'Corvane Dual',
    size: '8.0',
    locked: 'yes',
    spare: 'yes',
    tolerance: 'cough',
  },
  {
    act: 'swapped',
    condition: 'heavy',
    line: 'Halden',
    size: '6',
    locked: 'yes',
    spare: 'yes',
    tolerance: 'desaturation',
    spo2Low: 90,
    amount: 'moderate',
    colour: 'yellow',
    consistency: 'thick',
    blood: 'none',
    preOxygenated: 'yes',
    assistant: 'T. Okafor',
    note: 'Nebuliser given before.',
  },
  {
    act: 'cleaned',
    condition: 'moderate',
    line: 'Halden',
    size: '6',
    locked: 'yes',
    spare: 'no',
    tolerance: 'well',
    lot: 'H26-0192',
    expiresOn: '2029-01-31',
  },
  {
    act: 'unable',
    whyUnable: 'stuck',
    condition: 'not seen',
    spare: 'yes',
    tolerance: 'cough',
    note: 'Specialist called.',
  },
]
