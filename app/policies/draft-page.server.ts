import { type AnySetting, ruleSetInForce } from '#app/care/policy.ts'
import { typedValue } from '#app/care/setting-value.ts'
import type { FieldSection } from '#app/components/policy-editor.tsx'
import { env } from '#app/env.server.ts'
import { completeValues, settingSections } from '#app/rules/policy-values.ts'
import { showDateTime } from '#app/time/display.ts'
import { policies } from '#database/policies.server.ts'
import { policyDraft } from '#database/policy-drafts.server.ts'
import { startingValues, typedValues } from './draft-form.server.ts'
import type { PolicyPlace } from './policy-place.server.ts'

/** The draft of a ward's next version as a form shows it. */
export interface DraftPage {
  /** What a save says it saw; 0 when nothing is saved yet. */
  readonly rev: number
  /** Who saved it last, and when; null when nothing is saved yet. */
  readonly saved: string | null
  readonly sections: readonly FieldSection[]
}

/** The draft with the version in force beside it. Without a draft it starts from what is in force, or from the defaults. */
export async function draftPage(place: PolicyPlace, now: Date): Promise<DraftPage> {
  const { ward, ruleSet } = place
  const draft = await policyDraft({ wardId: ward.id, ruleSet })
  const start = await startingValues(place, now)
  const inForce = ruleSetInForce(await policies(), ward.id, ruleSet, now)
  const typed = typedValues(draft ? completeValues(ruleSet, draft.values) : start)
  const before = typedValues(completeValues(ruleSet, inForce?.values ?? {}))
  return {
    rev: draft?.rev ?? 0,
    saved: draft && `Saved by ${draft.changedByName} on ${showDateTime(draft.changedAt, env.hospitalTimeZone)}.`,
    sections: settingSections(ruleSet).map(({ id, title, settings }) => ({
      ...{ id, title },
      fields: settings.map(setting => fieldOf(setting, typed[setting.name] ?? '', before[setting.name] ?? '')),
    })),
  }
}

function fieldOf(setting: AnySetting, value: string, inForce: string) {
  const { name, label, unit, min, max, affects, source } = setting
  const type = typeof setting.default
  return {
    ...{ name, label, unit, value, inForce, affects },
    control: type === 'number' ? ('number' as const) : type === 'boolean' ? ('switch' as const) : ('list' as const),
    byDefault: typedValue(setting.default),
    range: min === undefined || max === undefined ? null : `${min} to ${max}`,
    source: source.says,
    standing: source.standing,
    error: null,
  }
}
