import { careKind } from '../kind.ts'
import { efforts } from '../observations/schema.ts'
import { sentence } from '../sentence.ts'
import { type AfterRemovalData, afterRemovals, voices } from './schema.ts'
import { afterRemovalSettings } from './settings.ts'
import { afterRemovalTasks } from './tasks.ts'
import { afterRemovalTrends } from './trends.ts'
import { afterRemovalWarnings, standingAfterRemoval } from './warnings.ts'

const well: AfterRemovalData = {
  respiratoryRate: 16,
  spo2: 97,
  effort: 'easy',
  stridor: 'no',
  voice: 'clear',
  monitored: 'yes',
  spareThere: 'yes',
}

/** Looks at somebody whose tube was taken out for good, closely at first. Nothing in them is filled in ahead. */
export const afterRemoval = careKind({
  ...afterRemovals,
  title: 'Observations after removal',
  chartWords: 'Chart set after removal',
  lane: 'Tube',
  chapter: 'Weaning and removal',
  cautions: ['Spare tubes and dilators stay at the bedside. Not an alarm: keep the monitor on.'],
  examples: [
    well,
    { ...well, voice: 'hoarse', note: 'Presses on the dressing to cough' },
    { ...well, respiratoryRate: 28, spo2: 92, effort: 'increased', voice: 'wet', monitored: 'no' },
    { ...well, respiratoryRate: 34, spo2: 88, effort: 'distress', stridor: 'yes', voice: 'none', spareThere: 'no' },
  ],
  summary: afterRemovalSentence,
  settings: afterRemovalSettings,
  tasks: afterRemovalTasks,
  trends: afterRemovalTrends,
  warnings: afterRemovalWarnings,
  standing: standingAfterRemoval,
  outOfRange: (data, context) => afterRemovalWarnings(data, context).length > 0,
})

function afterRemovalSentence(data: AfterRemovalData): string {
  const { respiratoryRate, spo2, effort, stridor, voice, monitored, spareThere, note } = data
  const voiceWords = voice === 'none' ? 'No voice.' : `Voice ${voices[voice].toLowerCase()}.`
  return [
    `Respiratory rate ${respiratoryRate} a min, SpO2 ${spo2}%.`,
    `Breathing: ${efforts[effort].toLowerCase()}${stridor === 'yes' ? ', with stridor' : ''}.`,
    voiceWords,
    `SpO2 ${monitored === 'yes' ? '' : 'not '}watched without a break.`,
    `Spare tubes and dilators ${spareThere === 'yes' ? 'there' : 'missing'}.`,
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}
