import { one } from './database.server.ts'

export async function loader() {
  return Response.json({ one: await one() })
}
