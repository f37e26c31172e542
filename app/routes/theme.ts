import { redirect } from 'react-router'
import { returnPath } from '#app/auth/return-to.ts'
import { themeCookie, themes } from '#app/components/theme.ts'
import { sentForm } from '#app/sent-form.server.ts'
import type { Route } from './+types/theme.ts'

export function loader() {
  return redirect('/')
}

/** Remembers day, night or whatever the device says, on this device, and goes back to the page it was asked from. */
export async function action({ request }: Route.ActionArgs) {
  const form = await sentForm(request)
  const theme = themes.find(name => name === form.get('theme')) ?? 'system'
  return redirect(returnPath(form.get('back')), { headers: { 'Set-Cookie': themeCookie(theme) } })
}
