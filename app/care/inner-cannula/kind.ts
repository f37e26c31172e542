import { careKind } from '../kind.ts'
import { isNarrowed } from './acts.ts'
import { innerCannulaChecks } from './checks.ts'
import { innerCannulaExamples } from './examples.ts'
import { fitByCatalogue } from './fit.ts'
import { innerCannulaActs } from './schema.ts'
import { innerCannulaSentence } from './sentence.ts'
import { innerCannulaSettings } from './settings.ts'
import { innerCannulaStart, notOfferedOfCannula, usualInnerCannula } from './start.ts'
import { innerCannulaUse, plannedInnerCannulas } from './supplies.ts'
import { innerCannulaTasks } from './tasks.ts'
import { innerCannulaWarnings, standingInnerCannulaWarnings } from './warnings.ts'

/** The removable lining of a dual-cannula tube: looked at, cleaned, replaced or swapped. */
export const innerCannula = careKind({
  ...innerCannulaActs,
  title: 'Inner cannula',
  chartWords: 'Chart cannula',
  lane: 'Inner cannula',
  chapter: 'At the bed',
  cautions: ['Use only the inner cannula made for this tube. Clean per device instructions.'],
  examples: innerCannulaExamples,
  summary: innerCannulaSentence,
  settings: innerCannulaSettings,
  checks: innerCannulaChecks,
  tasks: innerCannulaTasks,
  catalogued: fitByCatalogue,
  startsWith: innerCannulaStart,
  usual: usualInnerCannula,
  notOffered: notOfferedOfCannula,
  uses: innerCannulaUse,
  plannedUse: plannedInnerCannulas,
  warnings: innerCannulaWarnings,
  standing: standingInnerCannulaWarnings,
  outOfRange: data => isNarrowed(data) || data.act === 'unable',
})
