import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import sharp from 'sharp'
import { beforeEach, describe, expect, test } from 'vitest'
import { stomaAndSkin } from '#app/care/stoma-and-skin/kind.ts'
import { env } from '#app/env.server.ts'
import { loader as photographLoader } from '#app/routes/photograph.ts'
import { photographStore } from '#database/photograph-store.server.ts'
import { sweepFiles } from '#database/photographs.server.ts'
import { select } from '#database/sequelize.server.ts'
import { aCharting, chart, refusalOf, wholeForm } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { entryPages } from '#test/entries.ts'
import { answerOf, aPerson, contextOf, site } from '#test/people.ts'

let given: Awaited<ReturnType<typeof aCharting>>

beforeEach(async () => {
  await cleared()
  for (const { name } of await photographStore.list()) await photographStore.remove(name)
  given = await aCharting()
})

const FIELD = 'care.photographs'
const folder = join(env.dataFolder, 'photographs')
const filesLeft = () => (existsSync(folder) ? readdirSync(folder).length : 0)
const rows = () => select<{ id: string; width: number; height: number }>('SELECT id, width, height FROM photographs')

const solid = (width: number, height: number) => sharp({ create: { width, height, channels: 3, background: '#b56' } })

function formWith(files: readonly (readonly [name: string, bytes: Uint8Array])[]): FormData {
  const form = new FormData()
  for (const [name, value] of wholeForm(stomaAndSkin, given.nurse)) form.append(name, value)
  for (const [name, bytes] of files) form.append(FIELD, new File([new Uint8Array(bytes)], name, { type: 'image/png' }))
  return form
}

const send = (form: FormData) => chart(given.nurse, given.patientId, stomaAndSkin.slug, form)

test.each([
  ['a JPEG', () => solid(600, 400).jpeg().toBuffer()],
  ['a PNG', () => solid(600, 400).png().toBuffer()],
  ['a WebP', () => solid(600, 400).webp().toBuffer()],
  ['a JPEG in print colours', () => solid(600, 400).toColourspace('cmyk').jpeg().toBuffer()],
])('%s under any name becomes a picture of our own', async (_, make) => {
  const answer = await send(formWith([['scan.txt', await make()]]))
  expect(answer.status).toBe(302)
  expect(await rows()).toMatchObject([{ width: 600, height: 400 }])
  expect(filesLeft()).toBe(2)
})

test('what the camera noted is dropped, the picture stands upright, and a file behind it is gone', async () => {
  const taken = solid(600, 400).withExif({ IFD0: { Copyright: 'Jane at 51.5 N' } })
  const bytes = await taken.withMetadata({ orientation: 6 }).jpeg().toBuffer()
  await send(formWith([['a.jpg', Buffer.concat([bytes, Buffer.from('PK\u0003\u0004 a hidden archive')])]]))
  expect(await rows()).toMatchObject([{ width: 400, height: 600 }])
  for (const { name } of await photographStore.list()) {
    const stored = await photographStore.read(name)
    expect(stored?.includes('hidden archive')).toBe(false)
    expect((await sharp(stored).metadata()).exif).toBeUndefined()
  }
})

const svg = Buffer.from(
  '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><rect width="9" height="9"/></svg>',
)
const cutOff = async () => (await solid(900, 900).jpeg().toBuffer()).subarray(0, 1500)
const noPixels = async () => {
  const png = await solid(1, 1).png().toBuffer()
  png.writeUInt32BE(0, 16)
  return png
}
const moving = () =>
  sharp(Buffer.from(Array.from({ length: 20 * 10 * 3 }, (_, at) => (at < 300 ? 20 : 220))), {
    raw: { width: 10, height: 20, channels: 3, pageHeight: 10 },
  })
    .webp({ loop: 0, delay: [100, 100] })
    .toBuffer()

describe('a file that is no photograph is refused at its field, and leaves nothing behind', () => {
  test.each<[string, () => Promise<Uint8Array> | Uint8Array, string]>([
    ['an SVG', () => svg, 'no JPEG, PNG or WebP'],
    ['an archive', () => Buffer.from('PK\u0003\u0004 and more'), 'no JPEG, PNG or WebP'],
    ['an empty file', () => new Uint8Array(0), 'is empty'],
    ['a JPEG that was cut off', cutOff, 'is damaged'],
    ['a PNG without pixels', noPixels, 'is damaged'],
    ['a name alone of a JPEG', () => Buffer.from('\xff\xd8\xff and then words', 'latin1'), 'is damaged'],
    ['a picture of too many pixels', () => solid(9000, 9000).png().toBuffer(), 'more than 40 megapixels'],
    ['a file of more than 8 MB', () => Buffer.alloc(8 * 1024 * 1024 + 1, 0xff), 'larger than 8 MB'],
    ['a moving picture', moving, 'moving picture'],
  ])('%s', async (_, make, says) => {
    const refusal = refusalOf(await send(formWith([['wound.jpg', await make()]])))
    expect(refusal.errors[FIELD]?.join()).toContain(says)
    expect(refusal.typed['care.skin']).toEqual(['intact'])
    expect(refusal.typed[FIELD]).toBeUndefined()
    expect(filesLeft()).toBe(0)
    expect(await rows()).toEqual([])
  })
})

test('five photographs are one too many', async () => {
  const files = await Promise.all(
    [1, 2, 3, 4, 5].map(async n => [`${n}.png`, await solid(n, n).png().toBuffer()] as const),
  )
  expect(refusalOf(await send(formWith(files))).errors[FIELD]).toContain('Choose at most 4 photographs')
  expect(filesLeft()).toBe(0)
})

test('the same form sent twice is charted once, with one photograph', async () => {
  const form = formWith([['a.png', await solid(60, 40).png().toBuffer()]])
  const answers = [await send(form), await send(form)]
  expect(answers.map(({ status }) => status)).toEqual([302, 302])
  expect(await rows()).toHaveLength(1)
  expect(filesLeft()).toBe(2)
})

/** The id under which the form is charted. */
function idOf(form: FormData): string {
  const id = form.get('id')
  if (typeof id !== 'string') throw new Error('The form has no id')
  return id
}

test('a correction keeps what it names, and can name no photograph of another entry', async () => {
  const first = formWith([['a.png', await solid(60, 40).png().toBuffer()]])
  await send(first)
  const [kept] = await rows()
  const entryId = idOf(first)
  const correction = (photograph: string) => [
    ...wholeForm(stomaAndSkin, given.nurse),
    ['reason', 'Wrong place'] as const,
    [FIELD, photograph] as const,
  ]
  const foreign = await entryPages.correct(given.nurse, entryId, correction('018f0000-0000-7000-8000-000000000001'))
  expect(refusalOf(foreign).errors[FIELD]?.join()).toContain('belongs to another entry')
  const answer = await entryPages.correct(given.nurse, entryId, correction(kept?.id ?? ''))
  expect(answer.status).toBe(302)
  expect(await rows()).toHaveLength(1)
})

test('a photograph is shown to its ward, privately and as what it is, and to nobody else', async () => {
  await send(formWith([['a.png', await solid(60, 40).png().toBuffer()]]))
  const [photograph] = await rows()
  const photographId = photograph?.id ?? ''
  const see = (user: typeof given.nurse) => {
    const request = new Request(`${site}/photographs/${photographId}?size=small`)
    const args = { params: { photographId }, request, url: new URL(request.url), context: contextOf(user) }
    return photographLoader({ ...args, pattern: '/photographs/:photographId' })
  }
  const { headers } = await see(given.nurse)
  expect(headers.get('Content-Type')).toBe('image/webp')
  expect(headers.get('Cache-Control')).toBe('private, no-cache')
  expect(headers.get('X-Content-Type-Options')).toBe('nosniff')
  const stranger = await aPerson({ name: 'Stranger', wardIds: [] })
  expect((await answerOf(() => see(stranger))).status).toBe(404)
  const [look] = await select<{ looks: number }>(
    "SELECT COUNT(*) AS looks FROM access_log WHERE action = 'saw photograph'",
  )
  expect(look?.looks).toBe(1)
})

test('files that no entry names are swept once they are an hour old', async () => {
  await send(formWith([['a.png', await solid(60, 40).png().toBuffer()]]))
  await photographStore.write('018f0000-0000-7000-8000-000000000001.webp', Buffer.from('left behind'))
  const now = Date.now()
  expect(await sweepFiles(new Date(now))).toBe(0)
  expect(await sweepFiles(new Date(now + 3_700_000))).toBe(1)
  expect(filesLeft()).toBe(2)
})
