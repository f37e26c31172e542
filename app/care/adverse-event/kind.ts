import { careKind } from '../kind.ts'
import { bleedWindowFrom, bleedWindowTo } from '../suction/bleeding-settings.ts'
import { blindReinsertionBefore, repeatTubeOutWindow } from '../tube-change/settings.ts'
import { adverseEventExamples } from './examples.ts'
import { adverseEvents } from './schema.ts'
import { adverseEventSentence } from './sentence.ts'
import { adverseEventWarnings, standingAdverseEventWarnings } from './warnings.ts'

/** Something that went wrong with the airway or because of it. Nothing is ever due of it. */
export const adverseEvent = careKind({
  ...adverseEvents,
  title: 'Adverse event',
  chartWords: 'Chart event',
  lane: 'Tube',
  chapter: 'Events and plans',
  cautions: [
    'Help first, chart after. Also report it the way your hospital asks.',
    'Chart a tube that went back in as a tube change too: care is counted from there.',
  ],
  examples: adverseEventExamples,
  summary: adverseEventSentence,
  settings: [blindReinsertionBefore, repeatTubeOutWindow, bleedWindowFrom, bleedWindowTo],
  warnings: adverseEventWarnings,
  standing: standingAdverseEventWarnings,
  outOfRange: () => true,
})
