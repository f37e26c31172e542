import { one } from './database.server.ts'

export async function loader() {
  return { one: await one() }
}

export default function Page({ loaderData }: { readonly loaderData: Awaited<ReturnType<typeof loader>> }) {
  return <h1>{loaderData.one}</h1>
}
