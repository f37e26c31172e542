import { careKind } from '../kind.ts'
import { cuffChecksOfPolicy } from './checks.ts'
import { cuffState, foundClass } from './cuff.ts'
import { cuffChecks } from './schema.ts'
import { cuffSentence } from './sentence.ts'
import { cuffLower, cuffSettings, cuffUpper } from './settings.ts'
import { cuffTasks } from './tasks.ts'
import { cuffTrends } from './trends.ts'
import { cuffWarnings, standingCuffWarnings } from './warnings.ts'

/** The pressure in the cuff, and the cuff let down or inflated. */
export const cuffPressure = careKind({
  ...cuffChecks,
  title: 'Cuff pressure',
  chartWords: 'Chart pressure',
  lane: 'Cuff',
  chapter: 'At the bed',
  cautions: [
    'Pilot balloon feel is not a pressure.',
    'Cuff must be fully deflated before any valve or cap. Never use a valve with a foam cuff.',
    'Water cuffs: sterile water, measure mL, not cmH2O.',
  ],
  examples: [
    { found: 26, unit: 'cmH2O', method: 'manometer', position: 'head up' },
    { found: 34, unit: 'cmH2O', leftAt: 26, method: 'manometer', position: 'head up', reason: 'turned', airMl: -1 },
    { found: 14, unit: 'mmHg', leftAt: 18, method: 'controller', airMl: 1.5, leak: 'no' },
    { unit: 'cmH2O', method: 'not measured', whyNot: 'let down for a trial', cuffNow: 'deflated' },
  ],
  summary: cuffSentence,
  settings: cuffSettings,
  checks: cuffChecksOfPolicy,
  tasks: cuffTasks,
  startsWith: ({ ward }) => ({ unit: ward.pressureUnit }),
  gauges({ values, record }) {
    if (cuffState(record) !== 'inflated') return []
    const [lower, upper] = [values.of(cuffLower), values.of(cuffUpper)]
    return ['found', 'leftAt'].map(field => ({ field, unitField: 'unit', lower, upper, max: 50, unit: 'cmH2O' }))
  },
  trends: cuffTrends,
  warnings: cuffWarnings,
  standing: standingCuffWarnings,
  outOfRange: (data, context) => {
    const found = foundClass(data, context)
    return found !== undefined && found !== 'in range'
  },
})
