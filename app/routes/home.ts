import { redirect } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import type { Route } from './+types/home.ts'

/** The page each person usually wants first: those who lead a ward its board, those at the bedside their round. */
export function loader({ context }: Route.LoaderArgs) {
  const user = signedIn(context)
  const [ward] = ownSession(context).wards
  if (can(user, 'manage people')) return redirect('/admin/people')
  if (ward === undefined || !can(user, 'see ward', ward.id)) {
    return redirect(can(user, 'sign off competence') ? '/competence' : '/policy')
  }
  return redirect(
    can(user, 'chart care', ward.id) && !can(user, 'manage policy', ward.id) ? '/round' : `/wards/${ward.id}/board`,
  )
}
