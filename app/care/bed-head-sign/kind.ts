import { showDateTime } from '../../time/display.ts'
import { type CareContext, careKind } from '../kind.ts'
import type { Warning } from '../warning.ts'
import { changedSince, needsSign, printedSign } from './current.ts'
import { bedHeadSigns, type SignData, signForms } from './schema.ts'
import { depthPastTip } from './settings.ts'

const words: Readonly<Record<SignData['act'], string>> = {
  printed: 'Bed-head sign printed',
  downloaded: 'Bed-head sign made as a PDF',
  'taken down': 'Bed-head sign taken down and destroyed',
}

function signSentence({ act, form }: SignData): string {
  if (act === 'taken down') return `${words[act]}.`
  return `${words[act]}: ${signForms[form].charAt(0).toLowerCase()}${signForms[form].slice(1)}.`
}

/** A printed sign that shows what is no longer so stands until a new one is printed, or it is taken down. */
function outOfDate(context: CareContext): readonly Warning[] {
  const { record, ward } = context
  const sign = printedSign(record)
  const changed = sign ? changedSince(sign.data, context) : []
  if (!sign || changed.length === 0) return []
  const isNeeded = needsSign(record)
  return [
    {
      name: 'sign-out-of-date',
      level: 'amber',
      action: isNeeded
        ? 'Destroy the printed bed-head sign and print a new one.'
        : 'Take the printed bed-head sign down and destroy it.',
      cause: `Printed ${showDateTime(sign.performedAt, ward.zone)}; changed since: ${changed.join(', ')}.`,
      source: 'National Tracheostomy Safety Project, bed-head signs; that it ends with a change is a product proposal',
    },
  ]
}

/** The printed sign over the bed: which one hangs there, and whether it still tells the truth. */
export const bedHeadSign = careKind({
  ...bedHeadSigns,
  title: 'Bed-head sign',
  chartWords: 'Print the sign',
  lane: 'Tube',
  chapter: 'Tube',
  page: 'sign',
  settings: [depthPastTip],
  standing: outOfDate,
  examples: [
    { act: 'printed', form: 'open', tube: '01890f3c-7d3b-7a44-8f10-2f1d0c9a6b11', sutures: 'no' },
    {
      act: 'downloaded',
      form: 'not open',
      laryngoscopy: '3',
      airwayNotes: 'Small mouth opening after radiotherapy',
    },
    { act: 'taken down', form: 'open' },
  ],
  summary: signSentence,
})
