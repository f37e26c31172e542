import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { coreCriteria, furtherCriteria, type ReadinessData, readinessChecks } from './schema.ts'

const allYes: ReadinessData = {
  cause: 'yes',
  airway: 'yes',
  commands: 'yes',
  cuffDown: 'yes',
  secretions: 'yes',
  cough: 'yes',
  swallow: 'yes',
  heart: 'yes',
  chest: 'yes',
  team: 'yes',
}

/** How ready a patient is for the tube to come out for good: criteria, never a verdict. */
export const decannulationReadiness = careKind({
  ...readinessChecks,
  title: 'Readiness for tube removal',
  chartWords: 'Chart readiness',
  lane: 'Tube',
  chapter: 'Weaning and removal',
  cautions: ['It informs and does not decide. Answer what was looked at, and say why the rest was not.'],
  examples: [
    allYes,
    { ...allYes, cough: 'no', swallow: 'not assessed', whyNotSwallow: 'Scope booked for Thursday', team: 'no' },
    { ...allYes, carbonDioxide: 'yes', stenosis: 'yes', strength: 'yes', infection: 'yes', note: 'Ready by all' },
  ],
  summary: readinessSentence,
})

const labels: Readonly<Record<string, string>> = { ...coreCriteria, ...furtherCriteria }

function readinessSentence(data: ReadinessData): string {
  const answers = Object.entries(data).filter(([name]) => labels[name] !== undefined)
  const answered = (answer: string) => answers.filter(([, given]) => given === answer).map(([name]) => labels[name])
  const [yes, no, open] = [answered('yes'), answered('no'), answered('not assessed')]
  return [
    `Readiness for removal of the tube: ${yes.length} of ${answers.length} met.`,
    ...(no.length > 0 ? [`Not met: ${no.join(', ')}.`] : []),
    ...(open.length > 0 ? [`Not assessed: ${open.join(', ')}.`] : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}
