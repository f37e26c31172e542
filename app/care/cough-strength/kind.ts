import { type CareContext, careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import type { Warning } from '../warning.ts'
import { type CoughData, coughChecks, coughGrades } from './schema.ts'
import { coughFlowRetention, coughSettings } from './settings.ts'
import { coughVerdict } from './verdict.ts'

/** How strong the cough is: a grade on command, a peak flow with the place where it was measured. */
export const coughStrength = careKind({
  ...coughChecks,
  title: 'Cough strength',
  chartWords: 'Chart cough',
  lane: 'Suction',
  chapter: 'Weaning and removal',
  cautions: ['Flow at the tube is expiratory flow, not a true cough. An assisted cough counts.'],
  examples: [
    { grade: '4', route: 'not measured' },
    { route: 'mouth', peakFlow: 240, assisted: 'no' },
    { grade: '3', route: 'valve', peakFlow: 96, assisted: 'yes', note: 'Best of three' },
    { grade: '1', route: 'tube', peakFlow: 48, assisted: 'no' },
  ],
  summary: coughSentence,
  settings: coughSettings,
  warnings: coughWarnings,
})

const routes = {
  mouth: 'at the mouth',
  valve: 'through tube and valve',
  tube: 'at the tube (expiratory flow)',
} as const

function coughSentence({ grade, route, peakFlow, assisted, note }: CoughData): string {
  const flow =
    route === 'not measured'
      ? 'Peak flow not measured.'
      : `Peak flow ${peakFlow} L/min ${routes[route]}${assisted === 'yes' ? ', assisted' : ''}.`
  return [
    ...(grade === undefined ? [] : [`Cough grade ${coughGrades[grade].replace(':', ',')}.`]),
    flow,
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

function coughWarnings(data: CoughData, { values }: CareContext): readonly Warning[] {
  const found = coughVerdict(data, values)
  if (!found) return []
  const { verdict, route, peakFlow, limit } = found
  const retention = values.of(coughFlowRetention)
  if (verdict === 'not met') {
    return [
      {
        name: 'cough-too-weak',
        level: 'blue',
        action: 'Plan help with coughing, and tell the tracheostomy team before removal is planned.',
        cause: `${peakFlow} L/min ${routes[route]}; removal asks for more than ${limit}.`,
        source: 'Winck 2015; study of 2024 with a one-way valve',
      },
    ]
  }
  if (route !== 'mouth' || peakFlow >= retention) return []
  return [
    {
      name: 'cough-retention',
      level: 'blue',
      action: 'Plan help with coughing when secretions are thick or a chest infection comes.',
      cause: `${peakFlow} L/min at the mouth; below ${retention} secretions may be kept back.`,
      source: coughFlowRetention.source.says,
    },
  ]
}
