import { fieldsOf, isShown } from '../care/field.ts'
import type { AnyCareKind } from '../care/kind.ts'
import { sentence } from '../care/sentence.ts'
import { ownFields, readCare, readChart, readSpine } from './chart-form.ts'
import { type Calendar, performedAt, shortMoment } from './performed-at.ts'

/** Who signs, as a sentence ends with it. */
export interface Signer {
  readonly name: string
  readonly role: string
}

/** The sentence that will be charted, or what is still needed for one. */
export type LiveSentence =
  | { readonly ready: true; readonly says: string }
  | { readonly ready: false; readonly needed: readonly string[]; readonly wrong?: string }

/** What a form would chart as it stands. Pure, so that the browser and the server say the same. */
export function liveSentence(kind: AnyCareKind, sent: FormData, signer: Signer, calendar: Calendar): LiveSentence {
  const { form } = ownFields(kind, sent)
  const needed = missing(kind, form)
  if (needed.length > 0) return { ready: false, needed }
  const care = readCare(kind, form)
  if (care.status !== 'success') return { ready: false, needed: [], ...firstOf(care.error) }
  const spine = readSpine(form)
  if (!spine) {
    const whole = readChart(kind, form)
    return { ready: false, needed: [], ...(whole.status === 'success' ? {} : firstOf(whole.error)) }
  }
  const when = performedAt(spine, calendar)
  if (!when.ok) return { ready: false, needed: [], wrong: when.message }
  return { ready: true, says: chartedSentence(kind, care.value.care, when.at, signer, calendar) }
}

/** `14:06 Cuff pressure 26 cmH2O, by manometer, not adjusted. R. Osei, respiratory therapist.` */
export function chartedSentence(
  kind: AnyCareKind,
  care: unknown,
  at: Date,
  { name, role }: Signer,
  { now, zone }: Pick<Calendar, 'now' | 'zone'>,
): string {
  return `${shortMoment(at, now, zone)} ${sentence(kind.summary(care))} ${name}, ${role}.`
}

/** Labels of the questions that need an answer and have none, in the order of the form. */
function missing(kind: AnyCareKind, form: FormData): readonly string[] {
  const values = Object.fromEntries(fieldsOf(kind.schema).map(({ name }) => [name, form.getAll(`care.${name}`)]))
  return fieldsOf(kind.schema)
    .filter(({ name, meta, required }) => {
      const needed = required || (meta.neededThen === true && isShown(meta, values))
      return needed && form.getAll(`care.${name}`).every(value => value === '')
    })
    .map(({ meta }) => meta.label.charAt(0).toLowerCase() + meta.label.slice(1))
}

function firstOf(errors: Readonly<Record<string, readonly string[] | null>> | null): {
  readonly wrong?: string
} {
  const first = Object.values(errors ?? {}).find(messages => messages && messages.length > 0)?.[0]
  return first === undefined ? {} : { wrong: first }
}
