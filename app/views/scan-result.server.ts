import type { CurrentUser } from '#app/auth/permissions.ts'
import { can } from '#app/auth/permissions.ts'
import { codesText } from '#app/care/carried-field.ts'
import { recallOf } from '#app/care/recall.ts'
import {
  type CatalogueInnerCannula,
  type CatalogueTube,
  innerCannulaName,
  tubeName,
  tubesInWords,
} from '#app/catalogue/item.ts'
import { showLabelDate } from '#app/clinical/gs1-dates.ts'
import { type Gs1Item, itemOf } from '#app/clinical/gs1-scan.ts'
import { env } from '#app/env.server.ts'
import { filledFrom } from '#app/scanning/filled.ts'
import { scanFindings, stops } from '#app/scanning/findings.ts'
import { type Believed, readBackChoices, readBackOf } from '#app/scanning/read-back.ts'
import { carriedReading, gs1Scan, MOST_CODES, type Reading, readCode, type ScanForm } from '#app/scanning/scan-form.ts'
import { NO_SCAN, type ScanView } from '#app/scanning/scan-view.ts'
import { wantedBy } from '#app/scanning/wanted.ts'
import { STORE } from '#app/supplies/act-form.ts'
import { localDay } from '#app/time/zone.ts'
import { innerCannulaByGtin, innerCannulasFitting, tubeByGtin, tubesFitting } from '#database/catalogue.server.ts'
import { recalls } from '#database/lot-recalls.server.ts'
import type { ScanTarget } from './scan-target.server.ts'

/** Who scans, when, for which form of which patient, and whether this workstation's scanner sends separators. */
export interface Scanning {
  readonly user: CurrentUser
  readonly now: Date
  readonly isTrusted: boolean
  /** The wards of whoever scans. */
  readonly wards: readonly { readonly id: string; readonly name: string }[]
  readonly form: Pick<ScanTarget, 'kind' | 'context' | 'usedAt'> | null
}

/** What the codes of one item say: the item with what is wrong with it first, or what is still needed to know it. */
export async function scanResult(sent: ScanForm, scanning: Scanning): Promise<ScanView> {
  const readings = sent.added ? [...sent.before, sent.added] : sent.before
  const today = localDay(scanning.now, env.hospitalTimeZone)
  if (readings.length === 0)
    return { ...NO_SCAN, error: 'Nothing was read. Scan the code, or type what is printed below it.' }
  if (readings.length > MOST_CODES)
    return { ...kept(sent), error: 'These are more codes than one item has. Start again.' }
  const reading = itemOf(
    readings.map(one => gs1Scan(one, scanning.isTrusted)),
    today,
  )
  if (reading.ok) return itemView(reading.item, readings, sent, { ...scanning, today })
  if (reading.soFar) return { ...NO_SCAN, codes: readings.map(carriedReading), next: reading.says }
  return { ...kept(sent), error: reading.says }
}

/** What was typed stays where it was; the codes before it stand. */
function kept({ before, added }: ScanForm): ScanView {
  return { ...NO_SCAN, codes: before.map(carriedReading), typed: added?.source === 'typed' ? added.raw : '' }
}

async function itemView(
  item: Gs1Item,
  readings: readonly Reading[],
  sent: ScanForm,
  scanning: Scanning & { today: string },
) {
  const codes = readings.map(carriedReading)
  const [tube, cannula] = await Promise.all([tubeByGtin(item.gtin), innerCannulaByGtin(item.gtin)])
  const believed = readBackOf(item, sent.readBack, scanning.today)
  if (!tube && !cannula)
    return {
      ...NO_SCAN,
      codes,
      unknown: unknownItem(item, scanning.user),
      facts: factsOf(item, believed),
      links: linksOf(null, believed, scanning),
    }
  const known = tube ? await tubeFacts(tube) : await cannulaFacts(cannula as CatalogueInnerCannula)
  const facts = [...known.facts, ...factsOf(item, believed)]
  const shown = { ...NO_SCAN, codes, name: known.name, facts }
  if (!believed) return { ...shown, readBack: readBackChoices(item, scanning.today) }
  const judged = await judgedItem(known, believed, scanning)
  const fill = filled(known, believed, readings, scanning)
  return { ...shown, ...judged, fill, links: linksOf(known, believed, scanning) }
}

/** Where to read on about an item that is scanned to know it, and not for a form. */
function linksOf(
  known: KnownItem | null,
  believed: Believed | undefined,
  { form, user, wards }: Scanning,
): ScanView['links'] {
  if (form) return []
  const lot = believed?.lot && can(user, 'trace lots') ? believed.lot : null
  const list = known?.of === 'tube' ? 'tubes' : 'inner-cannulas'
  return [
    ...(known ? [{ href: `/catalogue/${list}/${known.item.id}`, words: 'In the catalogue' }] : []),
    ...(known?.of === 'tube'
      ? [{ href: `/catalogue/compare?tube=${known.item.id}`, words: 'Compare with other tubes' }]
      : []),
    ...(known ? wards.filter(({ id }) => can(user, 'keep supplies', id)) : []).map(({ id, name }) => ({
      href: `/wards/${id}/supplies/receive?${new URLSearchParams({ item: known?.item.id ?? '', to: STORE })}`,
      words: `Receive for ${name}`,
    })),
    ...(lot ? [{ href: `/lots?${new URLSearchParams({ lot })}`, words: `Who had lot ${lot}` }] : []),
  ]
}

function unknownItem({ gtin }: Gs1Item, user: CurrentUser): ScanView['unknown'] {
  return { gtin, mayDescribe: can(user, 'manage catalogue') }
}

interface KnownItem {
  readonly of: 'tube' | 'inner cannula'
  readonly item: CatalogueTube | CatalogueInnerCannula
  readonly name: string
  readonly facts: ScanView['facts']
  /** The tubes that an inner cannula is made for. */
  readonly fits: readonly string[]
}

async function tubeFacts(item: CatalogueTube): Promise<KnownItem> {
  const cannulas = await innerCannulasFitting(item.id)
  return {
    of: 'tube',
    item,
    name: tubeName(item),
    fits: [],
    facts: [
      {
        term: 'What',
        value: `Tube, ${item.construction} cannula, ${item.cuff === 'none' ? 'no cuff' : `${item.cuff} cuff`}`,
      },
      { term: 'Line', value: `${item.line}, ${item.maker}` },
      { term: 'Size', value: `${item.size} ${item.sizeSystem}` },
      ...(item.construction === 'dual'
        ? [{ term: 'Inner cannulas', value: cannulas.map(innerCannulaName).join('; ') || NOT_DESCRIBED }]
        : []),
    ],
  }
}

async function cannulaFacts(item: CatalogueInnerCannula): Promise<KnownItem> {
  const tubes = await tubesFitting(item.id)
  return {
    of: 'inner cannula',
    item,
    name: innerCannulaName(item),
    fits: tubes.map(({ id }) => id),
    facts: [
      { term: 'What', value: `Inner cannula, ${item.use}${item.fenestrated === 'yes' ? ', fenestrated' : ''}` },
      { term: 'Line', value: `${item.line}, ${item.maker}` },
      { term: 'Size', value: item.size },
      { term: 'Made for', value: tubesInWords(tubes) || NOT_DESCRIBED },
    ],
  }
}

const NOT_DESCRIBED = 'Not described yet'

function factsOf(item: Gs1Item, believed: Believed | undefined): ScanView['facts'] {
  const expiry = believed?.expiresOn && showLabelDate({ on: believed.expiresOn, monthOnly: believed.expiryMonthOnly })
  const made = item.producedOn && showLabelDate({ on: item.producedOn, monthOnly: item.productionMonthOnly })
  return [
    ...(believed ? [{ term: 'Lot', value: believed.lot ?? 'None in the code' }] : []),
    ...(believed ? [{ term: 'Expires', value: expiry || 'No date in the code' }] : []),
    ...(made ? [{ term: 'Made on', value: made }] : []),
    { term: 'Item number', value: item.gtin },
  ]
}

async function judgedItem(
  { of, item, name, fits }: KnownItem,
  believed: Believed,
  { form, today }: Scanning & { today: string },
) {
  const isUsed = form?.usedAt != null
  const judgedOn = form?.usedAt ? localDay(form.usedAt, env.hospitalTimeZone) : today
  const findings = scanFindings(
    {
      of,
      name,
      expiresOn: believed.expiresOn,
      retiredAt: item.retiredAt,
      recall: recallOf({ lot: believed.lot, line: item.line }, await recalls()),
      isUsed,
      wanted: form && wantedBy(form.kind, form.context, { id: item.id, line: item.line, size: item.size, fits }),
    },
    { today: judgedOn, zone: env.hospitalTimeZone },
  )
  return { findings, stops: stops(findings), isUsed }
}

function filled(known: KnownItem, { lot, expiresOn }: Believed, readings: readonly Reading[], { form }: Scanning) {
  if (!form) return null
  return filledFrom(form.kind, { ...known, lot, expiresOn, codes: codesText(readings.map(readCode)) })
}
