import type { StomaData } from './schema.ts'

const everywhere: StomaData['sites'] = ['flange left', 'flange right', 'flange top', 'flange bottom', 'back of neck']

/** The most common check: everything looked at, nothing found, nothing changed. */
export const usualCheck: StomaData = {
  appearance: ['clean'],
  exudate: 'none',
  bleeding: 'none',
  pain: 0,
  sites: everywhere,
  skin: 'intact',
  dressing: 'left in place',
  sutures: 'none',
  ties: 'two',
  holderChanged: 'no',
}

/** Checks as they are charted on a ward, from the usual one to those that need action. */
export const stomaExamples: readonly StomaData[] = [
  usualCheck,
  {
    appearance: ['redness', 'odour'],
    exudate: 'moderate',
    exudateType: 'coloured',
    bleeding: 'none',
    pain: 3,
    fever: 'no',
    swab: 'yes',
    sites: everywhere,
    skin: 'moisture damage',
    findingSite: 'flange bottom',
    dressing: 'changed',
    dressingType: 'absorbent',
    sutures: 'none',
    ties: 'one',
    holderChanged: 'yes',
    secondPerson: 'T. Okafor',
    note: 'Dressing was wet through',
  },
  {
    appearance: ['crusting'],
    exudate: 'scant',
    exudateType: 'bloody',
    bleeding: 'spotting',
    sites: [...everywhere, 'under sutures'],
    skin: 'pressure injury',
    stage: 'stage-2',
    findingSite: 'under sutures',
    sizeMm: 8,
    dressing: 'changed',
    dressingType: 'foam',
    sutures: 'removed now',
    ties: 'two',
    holderChanged: 'no',
    secondPerson: 'alone',
  },
]
