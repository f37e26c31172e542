import { v7 as uuidv7 } from 'uuid'
import { type Policy, ruleSetInForce } from '#app/care/policy.ts'
import { readSettingValue, typedValue } from '#app/care/setting-value.ts'
import { env } from '#app/env.server.ts'
import { completeValues, type PolicyDifference, policyDifferences, settingSections } from '#app/rules/policy-values.ts'
import { showDateTime } from '#app/time/display.ts'
import { policies } from '#database/policies.server.ts'
import { discardPolicyDraft, type PolicyDraft, policyDraft, savePolicyDraft } from '#database/policy-drafts.server.ts'
import type { PolicyPlace } from './policy-place.server.ts'

/** What came of a form with a draft: kept, thrown away, or shown again with what is wrong with it. */
export type DraftReply =
  | { readonly is: 'kept' | 'discarded' }
  | {
      readonly is: 'refused'
      readonly status: 400 | 409
      readonly typed: Readonly<Record<string, string>>
      readonly errors: Readonly<Record<string, string>>
      /** Somebody else saved meanwhile: who and when, what they changed, and the number to save under next. */
      readonly stale?: { readonly says: string; readonly rev: number; readonly theirs: readonly PolicyDifference[] }
    }

/** The values that a draft starts from: those in force, every setting among them. */
export async function startingValues({ ward, ruleSet }: PolicyPlace, now: Date): Promise<Policy['values']> {
  const inForce = ruleSetInForce(await policies(), ward.id, ruleSet, now)
  return completeValues(ruleSet, inForce?.values ?? {})
}

/** Does what a form with a draft asks: keeps every number that it holds, or throws the draft away. */
export async function draftChangedBy(sent: FormData, place: PolicyPlace, now: Date): Promise<DraftReply> {
  const { ward, ruleSet, user } = place
  const scope = { wardId: ward.id, ruleSet }
  const rev = Number(textOf(sent, 'rev') ?? Number.NaN)
  const draft = await policyDraft(scope)
  const base = draft?.values ?? (await startingValues(place, now))
  const { values, typed, errors } = readValues(sent, place, base)
  if (!Number.isSafeInteger(rev)) return { is: 'refused', status: 400, typed, errors: { '': LOST } }
  if (sent.get('intent') === 'discard') {
    const gone = await discardPolicyDraft({ ...scope, rev })
    return gone.outcome === 'done' ? { is: 'discarded' } : stale(gone.now, base, place, typed)
  }
  if (Object.keys(errors).length > 0) return { is: 'refused', status: 400, typed, errors }
  const kept = await savePolicyDraft({ ...scope, id: draft?.id ?? uuidv7(), rev, values }, user.id)
  return kept.outcome === 'done' ? { is: 'kept' } : stale(kept.now, await startingValues(place, now), place, typed)
}

const LOST = 'This form has lost a part of itself. Open it again, and copy what you typed.'

/** What stands in the fields, read by each setting. A setting that the form does not hold stays as it was. */
function readValues(sent: FormData, { ruleSet }: PolicyPlace, base: Policy['values']) {
  const values = { ...completeValues(ruleSet, base) }
  const typed: Record<string, string> = {}
  const errors: Record<string, string> = {}
  for (const { settings } of settingSections(ruleSet)) {
    for (const setting of settings) {
      const text = textOf(sent, `value.${setting.name}`)
      if (text === undefined) continue
      typed[setting.name] = text
      const read = readSettingValue(setting, text)
      if (read.ok) values[setting.name] = read.value
      else errors[setting.name] = read.problem
    }
  }
  return { values, typed, errors }
}

function textOf(sent: FormData, name: string): string | undefined {
  const [value, ...others] = sent.getAll(name)
  return typeof value === 'string' && others.length === 0 && value.length <= 300 ? value : undefined
}

function stale(
  now: PolicyDraft | null,
  before: Policy['values'],
  { ruleSet }: PolicyPlace,
  typed: Readonly<Record<string, string>>,
): DraftReply {
  const says = now
    ? `${now.changedByName} saved this draft on ${showDateTime(now.changedAt, env.hospitalTimeZone)}, after you opened it.`
    : 'Somebody published or discarded this draft after you opened it.'
  const theirs = now ? policyDifferences(ruleSet, before, now.values) : []
  return { is: 'refused', status: 409, typed, errors: {}, stale: { says, rev: now?.rev ?? 0, theirs } }
}

/** Values as they stand in the fields of the form. */
export function typedValues(values: Policy['values']): Readonly<Record<string, string>> {
  return Object.fromEntries(Object.entries(values).map(([name, value]) => [name, typedValue(value)]))
}
