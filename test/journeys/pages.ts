import type { RouteConfigEntry } from '@react-router/dev/routes'
import { careKinds } from '#app/care/kinds.ts'
import { demoCatalogue, demoTube } from '#database/seeders/catalogue.ts'

/** Ids that stand in addresses. */
export interface Known {
  readonly ward: string
  readonly patient: string
  /** An entry that counts. */
  readonly entry: string
  /** A patient of a ward that `nurse.birch` belongs to and `nurse.alder` does not. */
  readonly elsewhere: string
  readonly person: string
  /** A version of the policy of `ward` that has not started. */
  readonly policy: string
  /** A patient with trials of which one was passed. */
  readonly weaning: string
  /** A lot that patients had. */
  readonly lot: string
}

export interface PageEntry {
  /** As in `app/routes.ts`. */
  readonly route: string
  /** A demo account that may see it; null for somebody who has not signed in. */
  readonly as: string | null
  readonly path: (known: Known) => string
}

/** Addresses that answer with something else than a page. */
export const notPages: Readonly<Record<string, string>> = {
  health: 'plain text',
  'health/ready': 'JSON',
  '': 'leads to the page each person starts from',
  'sign-out': 'a form is sent to it',
  'sign-out-everywhere': 'a form is sent to it',
  theme: 'a form is sent to it',
  draft: 'the idle watch sends to it',
  'still-here': 'the idle watch sends to it',
  'calendar/:secret/tubes.ics': 'a calendar file',
  'patients/:patientId/sign.pdf': 'a PDF',
  'photographs/:photographId': 'a picture',
  'lots/export': 'a CSV file',
  'api/patients/:patientId/timeline': 'JSON',
  'api/wards/:wardId/board': 'JSON',
  'catalogue/export': 'CSV',
  'wards/:wardId/supplies/order.csv': 'a file',
}

const specialist = 'specialist'
const charge = 'charge.alder'
const administrator = 'administrator'
const tube = demoTube({ line: 'Halden', size: '6', cuff: 'none', fenestrated: 'no' }).id
const [innerCannula] = demoCatalogue.innerCannulas

/** Every page there is, each with an address or more. */
export const pages: readonly PageEntry[] = [
  { route: 'sign-in', as: null, path: () => '/sign-in' },
  { route: 'tubes', as: specialist, path: () => '/tubes' },
  { route: 'round', as: 'nurse.alder', path: () => '/round' },
  { route: 'wards/:wardId/board', as: charge, path: ({ ward }) => `/wards/${ward}/board` },
  { route: 'countersign', as: charge, path: () => '/countersign' },
  { route: 'competence', as: 'educator', path: () => '/competence' },
  { route: 'competence', as: charge, path: () => '/competence' },
  { route: 'competence/:userId', as: 'educator', path: ({ person }) => `/competence/${person}` },
  { route: 'wards/:wardId/admit', as: charge, path: ({ ward }) => `/wards/${ward}/admit` },
  { route: 'wards/:wardId/admit', as: charge, path: ({ ward }) => `/wards/${ward}/admit?known` },
  { route: 'wards/:wardId/supplies', as: 'nurse.alder', path: ({ ward }) => `/wards/${ward}/supplies` },
  { route: 'wards/:wardId/supplies/history', as: 'nurse.alder', path: ({ ward }) => `/wards/${ward}/supplies/history` },
  ...['receive', 'move', 'count', 'waste'].map(act => ({
    route: 'wards/:wardId/supplies/:act',
    as: 'nurse.alder',
    path: ({ ward }: Known) => `/wards/${ward}/supplies/${act}?find=corvane`,
  })),
  { route: 'wards/:wardId/access', as: charge, path: ({ ward }) => `/wards/${ward}/access` },
  { route: 'patients', as: 'nurse.alder', path: () => '/patients' },
  { route: 'patients/:patientId', as: 'nurse.alder', path: ({ patient }) => `/patients/${patient}` },
  { route: 'patients/:patientId', as: 'therapist.alder', path: ({ patient }) => `/patients/${patient}?span=7+days` },
  ...careKinds.map(({ slug }) => ({
    route: 'patients/:patientId/chart/:kind',
    as: specialist,
    path: ({ patient }: Known) => `/patients/${patient}/chart/${slug}`,
  })),
  { route: 'patients/:patientId/details', as: charge, path: ({ patient }) => `/patients/${patient}/details` },
  { route: 'patients/:patientId/move', as: charge, path: ({ patient }) => `/patients/${patient}/move` },
  { route: 'patients/:patientId/discharge', as: charge, path: ({ patient }) => `/patients/${patient}/discharge` },
  {
    route: 'patients/:patientId/emergency',
    as: 'nurse.alder',
    path: ({ patient }) => `/patients/${patient}/emergency`,
  },
  { route: 'patients/:patientId/sign', as: 'nurse.alder', path: ({ patient }) => `/patients/${patient}/sign` },
  {
    route: 'patients/:patientId/photographs',
    as: 'nurse.alder',
    path: ({ patient }) => `/patients/${patient}/photographs`,
  },
  ...(['patient', 'weaning'] as const).flatMap(who => [
    { route: 'patients/:patientId/trends', as: specialist, path: (known: Known) => `/patients/${known[who]}/trends` },
    { route: 'patients/:patientId/weaning', as: specialist, path: (known: Known) => `/patients/${known[who]}/weaning` },
  ]),
  {
    route: 'patients/:patientId/trends',
    as: 'nurse.alder',
    path: ({ patient }) => `/patients/${patient}/trends?span=Whole+stay`,
  },
  {
    route: 'patients/:patientId/act-now/:entryId',
    as: 'nurse.alder',
    path: ({ patient, entry }) => `/patients/${patient}/act-now/${entry}`,
  },
  { route: 'patients/:patientId/access', as: 'nurse.alder', path: ({ elsewhere }) => `/patients/${elsewhere}/access` },
  { route: 'entries/:entryId', as: charge, path: ({ entry }) => `/entries/${entry}` },
  { route: 'entries/:entryId/correct', as: charge, path: ({ entry }) => `/entries/${entry}/correct` },
  { route: 'entries/:entryId/retract', as: charge, path: ({ entry }) => `/entries/${entry}/retract` },
  { route: 'catalogue', as: 'nurse.alder', path: () => '/catalogue?retired=yes&order=od' },
  { route: 'catalogue', as: administrator, path: () => '/catalogue?items=inner-cannulas' },
  { route: 'catalogue/import', as: administrator, path: () => '/catalogue/import' },
  { route: 'catalogue/compare', as: 'nurse.alder', path: () => `/catalogue/compare?tube=${tube}` },
  { route: 'catalogue/compare', as: 'nurse.alder', path: ({ patient }) => `/catalogue/compare?patient=${patient}` },
  { route: 'catalogue/lines/:lineId', as: specialist, path: () => `/catalogue/lines/${innerCannula?.lineId}` },
  { route: 'catalogue/:items/new', as: specialist, path: () => '/catalogue/tubes/new' },
  { route: 'catalogue/:items/new', as: administrator, path: () => '/catalogue/inner-cannulas/new' },
  { route: 'catalogue/:items/:itemId', as: specialist, path: () => `/catalogue/tubes/${tube}` },
  { route: 'catalogue/:items/:itemId', as: 'nurse.alder', path: () => `/catalogue/inner-cannulas/${innerCannula?.id}` },
  { route: 'catalogue/:items/:itemId/edit', as: specialist, path: () => `/catalogue/tubes/${tube}/edit` },
  {
    route: 'catalogue/:items/:itemId/edit',
    as: administrator,
    path: () => `/catalogue/inner-cannulas/${innerCannula?.id}/edit`,
  },
  { route: 'scan', as: 'nurse.alder', path: () => '/scan' },
  { route: 'scan', as: 'nurse.alder', path: ({ patient }) => `/scan?for=/patients/${patient}/chart/inner-cannula` },
  { route: 'scan/set-up', as: 'nurse.alder', path: () => '/scan/set-up' },
  { route: 'lots', as: specialist, path: ({ lot }) => `/lots?lot=${lot}` },
  { route: 'account', as: 'observer.alder', path: () => '/account' },
  { route: 'policy', as: 'educator', path: () => '/policy' },
  { route: 'policy', as: specialist, path: ({ ward }) => `/policy?ward=${ward}&set=children` },
  { route: 'policy/draft', as: specialist, path: ({ ward }) => `/policy/draft?ward=${ward}` },
  { route: 'policy/draft', as: charge, path: ({ ward }) => `/policy/draft?ward=${ward}&set=children&changed=on` },
  { route: 'policy/review', as: specialist, path: ({ ward }) => `/policy/review?ward=${ward}` },
  {
    route: 'policy/compare',
    as: charge,
    path: ({ ward, policy }) => `/policy/compare?ward=${ward}&from=${policy}&to=${policy}`,
  },
  {
    route: 'policy/versions/:policyId/withdraw',
    as: charge,
    path: ({ policy }) => `/policy/versions/${policy}/withdraw`,
  },
  { route: 'wards/:wardId/care-plans', as: charge, path: ({ ward }) => `/wards/${ward}/care-plans` },
  { route: 'admin/people', as: administrator, path: () => '/admin/people' },
  { route: 'admin/people/new', as: administrator, path: () => '/admin/people/new' },
  { route: 'admin/people/:userId', as: administrator, path: ({ person }) => `/admin/people/${person}` },
  { route: 'admin/wards', as: administrator, path: () => '/admin/wards' },
  { route: 'admin/wards/:wardId', as: administrator, path: ({ ward }) => `/admin/wards/${ward}` },
]

/** The address of every route that answers by itself, as in `app/routes.ts`. */
export function routesOf(config: readonly RouteConfigEntry[], above = ''): string[] {
  return config.flatMap(({ path, children }) => {
    const here = [above, path].filter(Boolean).join('/')
    if (!children) return [here]
    const below = routesOf(children, here)
    // A layout has no address of its own, and with an index its own address is that of the index.
    return path === undefined || children.some(child => child.index) ? below : [here, ...below]
  })
}
