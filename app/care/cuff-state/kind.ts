import { careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { type CuffStateData, cuffActs, cuffReasons, cuffStates, cuffTolerances, suctionedFirst } from './schema.ts'
import { cuffStateWarnings, standingCuffStateWarnings } from './warnings.ts'

/** The cuff going down and up over the days. Checks of its pressure stand still while it is down. */
export const cuffStateKind = careKind({
  ...cuffStates,
  title: 'Cuff down or up',
  chartWords: 'Chart cuff',
  lane: 'Cuff',
  chapter: 'At the bed',
  cautions: [
    'Suction mouth and above the cuff before it goes down.',
    'Cuff must be fully deflated before any valve or cap. Measure the pressure within minutes of inflation.',
  ],
  examples: [
    {
      act: 'down',
      why: 'trial',
      agreedBy: 'R. Oseitutu, speech-language therapist',
      suctionFirst: 'both',
      volumeMl: 6.5,
      tolerance: 'well',
    },
    { act: 'up', why: 'not borne', volumeMl: 6, leak: 'no', tolerance: 'cough' },
    { act: 'seen up', leak: 'no', note: 'Found up at the start of the shift' },
    { act: 'seen down' },
    { act: 'down', why: 'swallow', agreedBy: 'Dr P. Silvennoinen', suctionFirst: 'none', tolerance: 'wet voice' },
  ],
  summary: cuffStateSentence,
  warnings: cuffStateWarnings,
  standing: standingCuffStateWarnings,
})

const lower = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)

function cuffStateSentence(data: CuffStateData): string {
  const { act, why, agreedBy, suctionFirst, volumeMl, leak, tolerance, note } = data
  const way = act === 'down' ? 'taken out' : 'put in'
  return [
    `Cuff ${lower(cuffActs[act])}${why ? `: ${lower(cuffReasons[why].replace(', see note', ''))}` : ''}.`,
    ...(agreedBy ? [sentence(`Agreed by ${agreedBy}`)] : []),
    ...(suctionFirst ? [`Suctioned first: ${lower(suctionedFirst[suctionFirst])}.`] : []),
    ...(volumeMl === undefined ? [] : [`${volumeMl} mL ${way}.`]),
    ...(leak === 'yes' ? ['Leak or voice with the cuff up.'] : leak === 'no' ? ['No leak.'] : []),
    ...(tolerance ? [`Tolerance: ${lower(cuffTolerances[tolerance])}.`] : []),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}
