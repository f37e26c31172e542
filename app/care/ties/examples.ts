import type { TieData } from './schema.ts'

/** The most common look: they fit, nothing is red, nothing was changed. */
export const usualLook: TieData = { fingers: 'two', skin: 'intact', changed: 'no', holder: 'padded' }

/** Looks at the ties as they are charted on a ward. */
export const tieExamples: readonly TieData[] = [
  usualLook,
  { fingers: 'one', skin: 'blanching redness', changed: 'yes', secondPerson: 'T. Okafor', holder: 'padded' },
  {
    fingers: 'two',
    skin: 'wet',
    changed: 'yes',
    secondPerson: 'alone',
    holder: 'tape',
    note: 'Soaked through; new tape fastened before the old one came off.',
  },
  { fingers: 'more than two', skin: 'broken', changed: 'no', holder: 'elastic' },
]
