import { type ActionFunctionArgs, data, redirect } from 'react-router'
import { insert } from './database.server.ts'

export async function action({ request }: ActionFunctionArgs) {
  const form = await request.formData()
  const id = form.get('id')
  if (typeof id !== 'string') throw data('Without an id', 400)
  await insert(id, JSON.stringify(Object.fromEntries(form)))
  return redirect('/')
}
