import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { standsSince } from '../standing.ts'
import type { Warning } from '../warning.ts'
import { type TransferData, transferItems, transferMoments, transfers } from './schema.ts'

/** What goes along on a move to another ward or unit. The arrival asks for a kit check and a cuff pressure. */
export const transferChecklist = careKind({
  ...transfers,
  title: 'Transfer checklist',
  chartWords: 'Chart transfer',
  lane: 'Tube',
  chapter: 'Events and plans',
  cautions: [
    'The kit stays with the patient all the way. The new place is ready before the patient leaves the old one.',
  ],
  examples: [
    { moment: 'leaving', place: 'Imaging, then Birch ward', complete: 'yes', handedTo: 'T. Okafor' },
    { moment: 'arrived', place: 'Birch ward', complete: 'no', missing: ['sign', 'staff'], handedTo: 'T. Okafor' },
  ],
  summary: ({ moment, place, complete, missing = [], handedTo, note }) =>
    [
      `${moment === 'leaving' ? 'Before leaving for' : 'Arrived at'} ${sentence(place)}`,
      complete === 'yes'
        ? 'Checklist complete.'
        : `Missing: ${missing.map(item => transferItems[item].toLowerCase()).join('; ')}.`,
      sentence(`Taken over by ${handedTo}`),
      ...(note ? [sentence(note)] : []),
    ].join(' '),
  warnings: transferWarnings,
  standing: ({ record, ...context }) =>
    standsSince(record.of(transfers), { isSettledBy: () => true, warns: transferWarnings }, { record, ...context }),
})

function transferWarnings({ moment, missing = [] }: TransferData): readonly Warning[] {
  if (missing.length === 0) return []
  const isLeaving = moment === 'leaving'
  return [
    {
      name: 'transfer-incomplete',
      level: 'amber',
      action: isLeaving
        ? 'Do not leave until it is there, and tell the charge nurse.'
        : 'Get it now, stay with the patient until it is there, and tell the charge nurse.',
      cause: `${transferMoments[moment]}, missing: ${missing.map(item => transferItems[item].toLowerCase()).join('; ')}.`,
      source: 'NHS Greater Glasgow and Clyde, essential equipment: the receiving area is ready before handover',
    },
  ]
}
