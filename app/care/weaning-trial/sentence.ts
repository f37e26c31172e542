import { sentence } from '../sentence.ts'
import { cuffLooks, stopReasons, trialNames, type WeaningTrialData } from './schema.ts'

const words = { start: 'started', found: 'found running', end: 'stopped' } as const

/** The sentence of a step of a trial: which, cuff, values before it, or why it stopped. */
export function weaningTrialSentence(data: WeaningTrialData): string {
  const { step, trial, cuffNow, respiratoryRate, spo2, heartRate, reasons, afterwards, note } = data
  const why = reasons ? `: ${reasons.map(reason => lower(stopReasons[reason])).join(', ')}` : ''
  return [
    `${trialNames[trial]} trial ${words[step]}${why}.`,
    cuffNow === 'none' || cuffNow === 'foam' ? `${cuffLooks[cuffNow]}.` : `Cuff ${lower(cuffLooks[cuffNow])}.`,
    ...(step === 'start' ? [preparedWords(data)] : []),
    ...(respiratoryRate !== undefined && spo2 !== undefined && heartRate !== undefined
      ? [`Before: respiratory rate ${respiratoryRate} a min, SpO2 ${spo2}%, heart rate ${heartRate} a min.`]
      : []),
    ...(afterwards ? [`Breathing ${afterwards} afterwards.`] : []),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

function preparedWords({ airflow, suctionFirst, supervised }: WeaningTrialData): string {
  const airflows = { yes: 'Airflow felt', no: 'No airflow felt', 'not checked': 'Airflow not checked' } as const
  return [
    airflow ? airflows[airflow] : '',
    suctionFirst === 'yes' ? 'suctioned first' : 'not suctioned first',
    supervised === 'yes' ? 'somebody stays.' : 'nobody stays.',
  ]
    .filter(Boolean)
    .join(', ')
}

/** A label inside a sentence; SpO2 keeps its capitals. */
export const lower = (label: string): string =>
  label === 'SpO2' ? label : label.charAt(0).toLowerCase() + label.slice(1)
