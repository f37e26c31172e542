import type { Typed } from '#app/charting/chart-form.ts'

/** What a form may be opened with besides answers: what is due or runs, and whether the usual is filled in. */
const OPENED_WITH = ['task', 'running', 'warning', 'usual']

/** The address of a form without the answers in it: those of the scan that is to come take their place. */
export function withoutAnswers(address: string): string {
  const [path = '', search = ''] = address.split('?', 2)
  const kept = [...new URLSearchParams(search)].filter(([name]) => OPENED_WITH.includes(name))
  return joined(path, new URLSearchParams(kept))
}

/** The address of a form with the answers of a scan in it. */
export function withAnswers(address: string, fill: Typed): string {
  const [path = '', search = ''] = address.split('?', 2)
  const params = new URLSearchParams(search)
  for (const [name, [value = '']] of Object.entries(fill)) params.set(name, value)
  return joined(path, params)
}

/** The address of a form as it is, with the usual filled in where nothing was scanned. */
export function withUsual(search: string): string {
  const params = new URLSearchParams(search)
  params.set('usual', '1')
  return joined('', params)
}

const joined = (path: string, params: URLSearchParams): string => (params.size === 0 ? path : `${path}?${params}`)
