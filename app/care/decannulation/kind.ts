import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { breathing, decannulations } from './schema.ts'
import { decannulationSettings } from './settings.ts'
import { removalWarnings, standingRemovalWarnings } from './warnings.ts'

/** The tube taken out for good, as planned. All tube care stops with it. */
export const decannulation = careKind({
  ...decannulations,
  title: 'Tube removal for good',
  chartWords: 'Chart removal',
  lane: 'Tube',
  needsFreshSignIn: true,
  twoPeople: () => true,
  settings: decannulationSettings,
  warnings: removalWarnings,
  standing: standingRemovalWarnings,
  examples: [
    { agreed: 'yes', operator: 'A. Bergqvist', helper: 'T. Okafor', breathing: 'comfortable', dressing: 'yes' },
  ],
  summary: data =>
    `Tube taken out for good by ${data.operator} with ${data.helper}. Breathing ${breathing[data.breathing].toLowerCase()}.${
      data.dressing === 'yes' ? ' Airtight dressing on.' : ' No airtight dressing.'
    }${data.agreed === 'no' ? ' Not agreed by the team.' : ''}${data.note ? ` ${sentence(data.note)}` : ''}`,
})
