import { unstable_coerceFormValue as coerced, parseWithZod } from '@conform-to/zod/v4'
import { z } from 'zod'
import { fieldsOf } from '../care/field.ts'
import type { AnyCareKind } from '../care/kind.ts'

/** The answers to "When": the moment the form shows, ten or thirty minutes before it, or a day and time of its own. */
export const whens = ['now', '10 min ago', '30 min ago', 'other'] as const

const REASON_LENGTH = 500 // characters that the record keeps of a reason

const lost = 'This form has lost a part of itself. Open it again, and copy what you typed.'

/** What a form carries that is sent once and says when something was done. */
export const momentFields = {
  /** Minted when the form was opened: the same id twice is the same act. */
  id: z.uuid(lost),
  /** Whose form it is: it is refused when somebody else is signed in by the time it is sent. */
  openedBy: z.uuid(lost),
  /** The moment (UTC) that the form shows as "Now", so that a second sending says the same. */
  at: z.iso.datetime(lost),
  when: z.enum(whens, 'Choose when it was done'),
  day: z.iso.date('Enter the day as a date').optional(),
  time: z
    .string('Enter one time')
    .regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'Enter the time as hours and minutes, such as 14:06')
    .optional(),
  occurrence: z.enum(['first', 'second'], 'Choose the first or the second').optional(),
}

/** What every chart form carries beside the care itself. */
const spine = {
  ...momentFields,
  /** Why it is written down so late, or why an entry is corrected. */
  reason: z
    .string('Enter one reason')
    .trim()
    .max(REASON_LENGTH, `The reason must be at most ${REASON_LENGTH} characters`)
    .regex(/^(?:[^\p{Cc}\p{Cs}]|[\n\r\t])*$/u, 'The reason has characters that cannot be stored')
    .optional(),
  witness: z.uuid('Choose the second person from the list').optional(),
  /** A final act charted without the password again, which the entry then says. */
  unsigned: z.literal('yes', 'Tick this, or leave it').optional(),
}

const spineSchema = z.object(spine)
const formSpine = coerced(spineSchema)

/** When, by whom and why, as a chart form says it. */
export type ChartSpine = z.output<typeof spineSchema>

/** What is to be done with a form: charted, or looked at without keeping it, by the page itself or by its second button. */
export const intents = ['chart', 'preview', 'review'] as const
export type Intent = (typeof intents)[number]

/** A button without a name, or the Enter key, charts. Undefined for an intent that no button has. */
export function intentOf(sent: FormData): Intent | undefined {
  const [given = 'chart', ...others] = sent.getAll('intent')
  return others.length === 0 ? intents.find(intent => intent === given) : undefined
}

/** What stands in a form, by the name of the field: `care.found`, `when`. */
export type Typed = Readonly<Record<string, readonly string[]>>

/** Stands for a file that was chosen and not sent: the server puts the photograph's own id in its place. */
const NOT_SENT_YET = 'ffffffff-ffff-4fff-8fff-ffffffffffff'

/** A form as it came: what its own fields hold, and the names it should not have. */
export interface FormRead {
  readonly form: FormData
  readonly unknown: readonly string[]
}

/** Passwords on a chart form: read by the server as it charts, and by nothing else. Drafts leave out whatever is so named. */
export const passwordFields = ['signerPassword', 'witnessPassword'] as const

const notFields: readonly string[] = ['intent', ...passwordFields]

/**
 * Keeps the fields that a form of this kind has. Names are compared before anything takes them for paths, since
 * `care.__proto__` or `care[9999999]` would be followed. A decimal comma counts as a point; files count as unknown, but for photographs.
 */
export function ownFields(kind: AnyCareKind, sent: FormData): FormRead {
  const fields = fieldsOf(kind.schema).filter(({ meta }) => meta.control !== 'decided')
  const care = new Map(fields.map(({ name, meta }) => [`care.${name}`, meta.control]))
  const form = new FormData()
  const unknown = new Set<string>()
  for (const [name, value] of sent) {
    const control = care.get(name)
    if (control === 'photographs' && typeof value !== 'string') {
      if (value.size > 0) form.append(name, NOT_SENT_YET)
      continue
    }
    if (typeof value !== 'string' || (control === undefined && !Object.hasOwn(spine, name))) {
      if (!notFields.includes(name)) unknown.add(name)
      continue
    }
    form.append(name, control === 'quantity' ? value.trim().replace(/^(-?\d+),(\d+)$/, '$1.$2') : value)
  }
  return { form, unknown: [...unknown] }
}

/** Everything that was typed into the form's own fields, by name: what a page shows again. */
export function typedIn(kind: AnyCareKind, sent: FormData): Typed {
  const { form } = ownFields(kind, sent)
  const names = [...new Set(form.keys())]
  const typed = names.map(name => [name, form.getAll(name).map(String).filter(Boolean)] as const)
  return Object.fromEntries(typed.filter(([, values]) => values.length > 0))
}

const schemas = new WeakMap<AnyCareKind, ReturnType<typeof schemasOf>>()

/** Made once a kind: making one takes longer than reading a form with it, which a page does at every key. */
function schemasFor(kind: AnyCareKind) {
  const made = schemas.get(kind) ?? schemasOf(kind)
  schemas.set(kind, made)
  return made
}

function schemasOf({ schema: care }: AnyCareKind) {
  return { chart: coerced(z.object({ ...spine, care })), care: coerced(z.object({ care })) }
}

/** The whole form, checked by the kind's own schema. */
export function readChart(kind: AnyCareKind, form: FormData) {
  return parseWithZod(form, { schema: schemasFor(kind).chart, disableAutoCoercion: true })
}

/** When, by whom and why alone, so that a mistake there is said even while the care is not complete. */
export function readSpine(form: FormData): ChartSpine | undefined {
  const submission = parseWithZod(form, { schema: formSpine, disableAutoCoercion: true })
  return submission.status === 'success' ? submission.value : undefined
}

/** The care alone: what the live sentence is made of. */
export function readCare(kind: AnyCareKind, form: FormData) {
  return parseWithZod(form, { schema: schemasFor(kind).care, disableAutoCoercion: true })
}

/** Answers by field, such as an entry's payload, as they are typed into a form. */
export function typedFrom(answers: Readonly<Record<string, unknown>>): Typed {
  return Object.fromEntries(
    Object.entries(answers)
      .filter(([, value]) => value !== undefined && value !== null)
      .map(([name, value]) => [`care.${name}`, Array.isArray(value) ? value.map(String) : [String(value)]]),
  )
}
