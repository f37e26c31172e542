import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { freeNotes } from './schema.ts'

/** Free words on the timeline, for what no other form holds. Nothing is ever due of it. */
export const freeNote = careKind({
  ...freeNotes,
  title: 'Note',
  chartWords: 'Chart note',
  lane: 'Tube',
  chapter: 'Events and plans',
  cautions: ['Nothing here warns or is counted as care done: chart findings and care on their own forms.'],
  examples: [
    { words: 'Family visited; daughter shown how to clean the stoma.' },
    { words: 'Speech-language therapist reviewed' },
  ],
  summary: ({ words }) => sentence(words),
})
