import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { bleedWindowFrom, bleedWindowTo, streaksAreRed } from '../suction/bleeding-settings.ts'
import { colourFlags, type SecretionGradeData, scoreColumns, secretionGrades } from './schema.ts'
import { secretionScore } from './score.ts'
import { secretionTrends } from './trends.ts'
import { secretionGradeWarnings, standingSecretionWarnings } from './warnings.ts'

/** Secretions by published grades with their sum, so that days can be compared. */
export const secretionGrade = careKind({
  ...secretionGrades,
  title: 'Secretion grading',
  chartWords: 'Chart grading',
  lane: 'Suction',
  chapter: 'At the bed',
  cautions: ['The sum compares days of one patient; it decides nothing.'],
  examples: [
    {
      cough: 'vigorous',
      passes: 'one',
      colour: 'tan',
      viscosity: 'thick',
      interval: 'one to two',
      flags: ['none'],
    },
    { cough: 'vigorous', passes: 'none', colour: 'clear', viscosity: 'watery', interval: 'rare', flags: ['none'] },
    {
      cough: 'weak',
      passes: 'three',
      colour: 'green',
      viscosity: 'tenacious',
      interval: 'often',
      flags: ['streaks', 'feed'],
      note: 'Swab sent',
    },
  ],
  summary: gradeSentence,
  settings: [bleedWindowFrom, bleedWindowTo, streaksAreRed],
  trends: secretionTrends,
  warnings: secretionGradeWarnings,
  standing: standingSecretionWarnings,
  outOfRange: (data, context) => secretionGradeWarnings(data, context).some(({ level }) => level !== 'blue'),
})

function gradeSentence(data: SecretionGradeData): string {
  const { cough, passes, colour, viscosity, interval, flags, note } = data
  const seen = flags.filter(flag => flag !== 'none').map(flag => colourFlags[flag].toLowerCase())
  return [
    `Secretions graded ${secretionScore(data)} of 15.`,
    `Cough ${scoreColumns.cough[cough].toLowerCase()}, ${passes === 'none' ? 'nothing to clear' : scoreColumns.passes[passes]}, ${scoreColumns.colour[colour].toLowerCase()}, ${scoreColumns.viscosity[viscosity].toLowerCase()}, suction ${scoreColumns.interval[interval].toLowerCase()}.`,
    ...(seen.length > 0 ? [`Also seen: ${seen.join(', ')}.`] : []),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}
