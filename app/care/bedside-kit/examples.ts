import type { KitData } from './schema.ts'

/** The most common check: everything lies there, and suction works. */
export const wholeKit: KitData = { complete: 'yes', suctionTested: 120, suctionUnit: 'mmHg' }

/** Checks of the kit as they are charted on a ward. */
export const kitExamples: readonly KitData[] = [
  { spares: 'Tube Halden 6 Jackson and one size smaller; plain inner cannula Halden 6', ...wholeKit },
  {
    complete: 'no',
    missing: ['spare smaller', 'obturator'],
    owner: 'T. Okafor',
    expectedMin: 10,
    suctionTested: 16,
    suctionUnit: 'kPa',
    note: 'Used at the change this morning',
  },
  { complete: 'no', missing: ['suction'], owner: 'Equipment library' },
]
