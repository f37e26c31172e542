import type { AnyCharted } from './kind.ts'

/** The version that entries of this kind are written in today: one more than its upgrades. */
export function versionOf(kind: AnyCharted): number {
  return (kind.upgrades?.length ?? 0) + 1
}

export type ReadPayload = { readonly ok: true; readonly data: unknown } | { readonly ok: false; readonly why: string }

/**
 * A stored payload in today's shape: upgraded version by version, then checked by the kind's schema.
 * What cannot be read is said, never dropped: the caller shows the raw text.
 */
export function readPayload(kind: AnyCharted, version: number, raw: unknown): ReadPayload {
  const upgrades = kind.upgrades ?? []
  if (!Number.isInteger(version) || version < 1 || version > versionOf(kind)) {
    return { ok: false, why: `version ${version} is not known` }
  }
  const current = upgrades.slice(version - 1).reduce<unknown>((old, upgrade) => upgrade(old as never), raw)
  const parsed = kind.schema.safeParse(current)
  return parsed.success
    ? { ok: true, data: parsed.data }
    : { ok: false, why: parsed.error.issues.map(issue => `${issue.path.join('.')}: ${issue.message}`).join('; ') }
}
