import { data, type RouterContextProvider } from 'react-router'
import { type CurrentUser, can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import type { RuleSet } from '#app/care/policy.ts'
import { allWards, type Ward } from '#database/wards.server.ts'

/** A request for a page about a policy: `?ward=` and `?set=` say which. */
export interface PolicyRequest {
  readonly context: Readonly<RouterContextProvider>
  readonly url: URL
}

/** Whose policy a page is about. */
export interface PolicyPlace {
  readonly user: CurrentUser
  readonly ward: Ward
  readonly ruleSet: RuleSet
  /** The wards that this person may do the same for. */
  readonly wards: readonly { readonly id: string; readonly name: string }[]
}

/** The ward and the rule set of an address, if this person may do this there. Throws a 403 for an act that is not theirs, else a 404. */
export async function policyPlace(
  { context, url }: PolicyRequest,
  act: 'see policy' | 'manage policy',
): Promise<PolicyPlace> {
  const user = signedIn(context)
  if (!can(user, act)) throw data('Policies are changed by charge nurses and specialists.', 403)
  const wards = (await allWards()).filter(ward => can(user, act, ward.id) && !ward.retired)
  const asked = url.searchParams.get('ward')
  const ward = asked === null ? wards[0] : wards.find(({ id }) => id === asked)
  if (!ward) throw data('There is no such ward.', 404)
  const ruleSet = url.searchParams.get('set') === 'children' ? 'children' : 'adults'
  return { user, ward, ruleSet, wards: wards.map(({ id, name }) => ({ id, name })) }
}

/** The address of a page about the policy of a ward. */
export function policyHref(page: string, { ward, ruleSet }: { ward: Pick<Ward, 'id'>; ruleSet: RuleSet }): string {
  return `/policy${page}?ward=${ward.id}${ruleSet === 'children' ? '&set=children' : ''}`
}
