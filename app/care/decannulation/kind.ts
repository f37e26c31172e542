import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { plannedRemoval } from '../weaning-plan/tasks.ts'
import { breathing, type DecannulationData, decannulations, removalKit } from './schema.ts'
import { decannulationSettings } from './settings.ts'
import { removalWarnings, standingRemovalWarnings } from './warnings.ts'

/** The tube taken out for good, as planned. All tube care stops with it. */
export const decannulation = careKind({
  ...decannulations,
  title: 'Tube removal for good',
  chartWords: 'Chart removal',
  lane: 'Tube',
  chapter: 'Weaning and removal',
  needsFreshSignIn: true,
  needsCompetence: 'decannulation',
  twoPeople: () => true,
  settings: decannulationSettings,
  warnings: removalWarnings,
  standing: standingRemovalWarnings,
  tasks: [plannedRemoval],
  cautions: ['Two staff, with the whole kit at the bedside. Observations are due within minutes.'],
  examples: [
    {
      agreed: 'yes',
      operator: 'A. Bergqvist',
      helper: 'T. Okafor',
      kit: 'complete',
      breathing: 'comfortable',
      dressing: 'yes',
    },
    {
      agreed: 'no',
      operator: 'A. Bergqvist',
      helper: 'T. Okafor',
      kit: 'incomplete',
      kitMissing: ['dilators'],
      breathing: 'laboured',
      dressing: 'no',
    },
  ],
  summary: removalSentence,
})

function removalSentence(data: DecannulationData): string {
  const { operator, helper, kit, kitMissing = [], dressing, agreed, note } = data
  return [
    `Tube taken out for good by ${operator} with ${helper}.`,
    `Breathing ${breathing[data.breathing].toLowerCase()}.`,
    ...(kit === 'complete' ? ['Kit complete.'] : []),
    ...(kitMissing.length > 0
      ? [`Missing: ${kitMissing.map(item => removalKit[item].toLowerCase()).join(', ')}.`]
      : []),
    dressing === 'yes' ? 'Airtight dressing on.' : 'No airtight dressing.',
    ...(agreed === 'no' ? ['Not agreed by the team.'] : []),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}
