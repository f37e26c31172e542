import type { CuffState } from '../cuff-pressure/cuff.ts'
import type { PatientFacts } from '../kind.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'

const NTSP = 'National Tracheostomy Safety Project, speaking valve trials: never with an inflated or foam cuff'

/** A valve or cap where air cannot get out again: with the cuff up, with a foam cuff, after a laryngectomy (domain 5.2). */
export function closedTube(
  on: 'valve' | 'cap',
  { state, upperAirway }: { readonly state: CuffState; readonly upperAirway: PatientFacts['upperAirway'] },
): readonly Warning[] {
  const first = `Take the ${on} off now.`
  const about = { name: 'valve-with-cuff-up', level: 'red', source: NTSP } as const
  if (upperAirway === 'not open') {
    const action = `${first} The mouth does not connect to the lungs. Check the patient, then call for help. ${LOCAL_PLAN}`
    return [{ ...about, action, cause: `A ${on} is on the only airway of a laryngectomy.` }]
  }
  if (state === 'foam') {
    const action = `${first} This cuff cannot be fully emptied. Call the tracheostomy team. ${LOCAL_PLAN}`
    return [{ ...about, action, cause: `A ${on} is on with a foam cuff.` }]
  }
  if (state !== 'inflated' && state !== 'water') return []
  const action = `${first} The patient may not be able to breathe out. Check the patient, then call for help. ${LOCAL_PLAN}`
  return [{ ...about, action, cause: `A ${on} is on with the cuff up.` }]
}
