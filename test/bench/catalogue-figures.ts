import { largeCatalogue } from './catalogue.ts'
import type { FilledDatabase } from './databases.ts'
import type { Comparison, Setting, Side } from './figures.ts'
import type { Ask } from './requests.ts'
import type { Served } from './servers.ts'

const { tubes, innerCannulas } = largeCatalogue()
const [tube, cannula] = [tubes.at(-1), innerCannulas.at(-1)]

/** The catalogue with 2,000 tubes and 500 inner cannulas in it: its list, its filters, tubes side by side, and a scanned label. */
export function catalogueComparisons({
  large,
  small,
  application,
  applicationOnSmall,
  bare,
}: Setting): readonly Comparison[] {
  const floor: Side = { server: bare, status: 200, requests: 40, begin: async () => () => ({ path: '/' }) }
  const list = page(application, large, '/catalogue')
  return [
    { name: 'Catalogue of 2,000 tubes', target: 6, ours: list, floor },
    {
      name: 'The same against 56 tubes',
      target: 1.5,
      ours: list,
      floor: page(applicationOnSmall, small, '/catalogue'),
    },
    {
      name: 'Searched, filtered and sorted',
      target: 6,
      ours: page(application, large, '/catalogue?find=corvane+8&cuff=air&sizeSystem=ISO+5366&order=od'),
      floor,
    },
    {
      name: 'Tubes side by side',
      target: 6,
      ours: page(application, large, `/catalogue/compare?tube=${tube?.id}`),
      floor,
    },
    { name: 'A scanned label', target: 6, ours: scan(application, large), floor },
  ]
}

function page(server: Served, { cookie }: FilledDatabase, path: string): Side {
  const headers = { Cookie: cookie, Accept: 'text/html' }
  return { server, status: 200, requests: 20, begin: async () => () => ({ path, headers }) }
}

/** As the page for scanning sends it without scripts: its whole answer is drawn. */
function scan(server: Served, { cookie }: FilledDatabase): Side {
  const headers = { Cookie: cookie, Accept: 'text/html', Origin: `http://127.0.0.1:${server.port}` }
  const form = new URLSearchParams({ for: '', source: 'typed', code: `(01)${cannula?.gtin}(17)491231(10)7B` })
  const next = (): Ask => ({ path: '/scan', headers, form })
  return { server, status: 200, requests: 20, begin: async () => next }
}
