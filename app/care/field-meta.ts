import { z } from 'zod'

/** The two things of the catalogue that are scanned and charted. */
export type ItemKind = 'tube' | 'inner cannula'

/** What every field may say of itself. */
export interface Shared {
  readonly label: string
  readonly hint?: string
  /** Heading that this field stands under; a field without one continues the section before it. */
  readonly section?: string
  /** Kept out of the way under "More details": good to have, not needed to chart the act. */
  readonly more?: boolean
  /** The question only arises when another field of the same form has one of these values. */
  readonly when?: { readonly field: string; readonly is: readonly string[] }
  /** With `when`: an answer is needed once the question arises. */
  readonly neededThen?: boolean
}

export interface QuantityMeta extends Shared {
  readonly control: 'quantity'
  /** Unit as shown beside the number; absent when `unitField` names the field that holds it. */
  readonly unit?: string
  readonly unitField?: string
  readonly min: number
  readonly max: number
  readonly step: number
  /** Drawn large, with a keypad: the number that the act is about. */
  readonly large?: boolean
}
export interface ChoiceMeta extends Shared {
  readonly control: 'choice' | 'choices'
  readonly options: Readonly<Record<string, string>>
}
export interface TextMeta extends Shared {
  readonly control: 'text' | 'note'
  readonly maxLength: number
}
export interface DateMeta extends Shared {
  readonly control: 'date'
}
/** A name chosen from a list that the page supplies: a due task, a policy setting, or a warning that stands. */
export interface NameMeta extends Shared {
  readonly control: 'task' | 'setting' | 'warning'
}
/** The lists that a page supplies, by the control that chooses from them. */
export type NameLists = Readonly<Record<NameMeta['control'], Readonly<Record<string, string>>>>
/** An item of the catalogue, filled in by a scan and carried by the form; nobody types it. */
export interface ItemMeta extends Shared {
  readonly control: 'item'
  readonly of: ItemKind
  /** Fields of the same form that hold what is printed on the item, apart or both in one: they have to say what the catalogue says of it. */
  readonly prints: { readonly line: string; readonly size: string } | { readonly both: string }
}
/** Codes as they were scanned, carried by the form. */
export interface CodesMeta extends Shared {
  readonly control: 'codes'
}
/** Settled by the catalogue as the act is charted; no form sends it. */
export interface DecidedMeta extends Shared {
  readonly control: 'decided'
}
/** Files that are sent with the form and kept as photographs; the stored answer is their ids. */
export interface PhotographsMeta extends Shared {
  readonly control: 'photographs'
  readonly most: number
}
/** Questions that somebody answers. */
export type AskedMeta = QuantityMeta | ChoiceMeta | TextMeta | DateMeta | NameMeta | PhotographsMeta
/** What comes with a scan or from the catalogue. */
export type CarriedMeta = ItemMeta | CodesMeta | DecidedMeta
/** What a form needs to know to draw one field: declared once, beside the value's own rules. */
export type FieldMeta = AskedMeta | CarriedMeta

const carried: readonly string[] = ['item', 'codes', 'decided'] satisfies CarriedMeta['control'][]

/** Whether nobody is asked for it. */
export function isCarried(meta: FieldMeta): meta is CarriedMeta {
  return carried.includes(meta.control)
}

/** Metadata by schema; `fieldsOf` reads it. */
export const fieldMetas = z.registry<FieldMeta>()

/** What may be said of a field besides its label. */
export type Extra = Omit<Shared, 'label'>

/** A label in the middle of a sentence. */
export const inSentence = (label: string): string => label.charAt(0).toLowerCase() + label.slice(1)
