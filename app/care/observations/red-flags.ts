import { leakWarnings } from '../cuff-pressure/leak.ts'
import { BLEED_ACTION } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { swellingWarning } from '../stoma-and-skin/opening.ts'
import { bleedWarnings } from '../suction/bleeding.ts'
import { bleedWindowTo } from '../suction/bleeding-settings.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { type ObservationData, type RedFlag, redFlags } from './schema.ts'

const TEACHING = 'Red flags in teaching texts (NHS Wales, RCEM learning)'

/** Flags that have a rule of their own; the others ask for a look together. */
const ownRule: readonly RedFlag[] = ['none', 'voice', 'moved', 'blood', 'pulse', 'swelling']

/** What the tick-list of red flags asks people to notice. */
export function redFlagWarnings({ redFlags: seen = [] }: ObservationData, context: CareContext): readonly Warning[] {
  return [
    ...(seen.includes('swelling') ? [swellingWarning(redFlags.swelling, context.record)] : []),
    ...(seen.includes('moved') ? [moved] : []),
    ...bleedWarnings('red-flag-blood', seen.includes('blood') ? 'fresh' : undefined, context),
    ...(seen.includes('pulse') ? [pulsating] : []),
    ...(seen.includes('voice') ? leakWarnings({ unit: 'cmH2O', method: 'not measured', leak: 'yes' }, context) : []),
    ...others(seen.filter(flag => !ownRule.includes(flag))),
  ]
}

const moved: Warning = {
  name: 'red-flag-tube-moved',
  level: 'red',
  action: `Check the tube position now. The tube or cuff may have moved or failed. Call for help. ${LOCAL_PLAN}`,
  cause: `${redFlags.moved}.`,
  source: TEACHING,
}

const pulsating: Warning = {
  name: 'red-flag-pulse',
  level: 'red',
  action: BLEED_ACTION,
  cause: `${redFlags.pulse}: it may lie against a large artery.`,
  source: bleedWindowTo.source.says,
}

function others(flags: readonly RedFlag[]): readonly Warning[] {
  if (flags.length === 0) return []
  return [
    {
      name: 'red-flags',
      level: 'amber',
      action: 'Look at the patient now: tube, inner cannula, cuff, suction. Tell the charge nurse within 15 minutes.',
      cause: `Red flag: ${flags.map(flag => redFlags[flag].toLowerCase()).join('; ')}.`,
      source: TEACHING,
    },
  ]
}
