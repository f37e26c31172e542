import { careKind } from '../kind.ts'
import { breathing, decannulations } from './schema.ts'

/** The tube taken out for good, as planned. All tube care stops with it. */
export const decannulation = careKind({
  ...decannulations,
  title: 'Tube removal for good',
  chartWords: 'Chart removal',
  lane: 'Tube',
  examples: [
    { agreed: 'yes', operator: 'A. Bergqvist', helper: 'T. Okafor', breathing: 'comfortable', dressing: 'yes' },
  ],
  summary: data =>
    `Tube taken out for good by ${data.operator} with ${data.helper}. Breathing ${breathing[data.breathing].toLowerCase()}.${
      data.dressing === 'yes' ? ' Airtight dressing on.' : ' No airtight dressing.'
    }${data.agreed === 'no' ? ' Not agreed by the team.' : ''}`,
})
