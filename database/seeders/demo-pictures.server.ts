import { createHash } from 'node:crypto'
import sharp from 'sharp'
import { findKind } from '#app/care/kinds.ts'
import { photographsIn } from '#app/care/photographs.ts'
import type { NewPhotograph } from '../photographs.server.ts'
import type { DemoEntry } from './rows.ts'

const WIDTH = 800
const HEIGHT = 600
const SMALL_PX = 320
const STRIPE_PX = 40

/** A picture for each photograph that an entry of the demo hospital names, with that entry. */
export interface DemoPicture extends NewPhotograph {
  readonly entryId: string
  readonly stayId: string
}

/** Draws the photographs of a demo hospital: rings on a striped ground, which nobody takes for a person. */
export async function demoPictures(entries: readonly DemoEntry[]): Promise<readonly DemoPicture[]> {
  const named = entries.flatMap(({ id: entryId, stayId, kind: slug, raw }) => {
    const kind = findKind(slug)
    return kind ? photographsIn(kind, raw).map(id => ({ id, entryId, stayId })) : []
  })
  return Promise.all(
    named.map(async (one, index) => ({ ...one, file: one.id, ...(await drawn(named.length - index)) })),
  )
}

/** Row of a picture in the table of photographs. */
export function pictureRow({ id, entryId, stayId, file, width, height, large, sha256 }: DemoPicture) {
  return { id, entry_id: entryId, stay_id: stayId, file, width, height, bytes: large.byteLength, sha256 }
}

/** The wider the red ring, the worse the pretended wound: the later of two pictures has the narrower one. */
async function drawn(severity: number) {
  const raw = { width: WIDTH, height: HEIGHT, channels: 3 } as const
  const large = await sharp(pixels(severity), { raw }).webp({ quality: 80 }).toBuffer()
  const small = await sharp(large).resize({ width: SMALL_PX }).webp({ quality: 80 }).toBuffer()
  return { large, small, width: WIDTH, height: HEIGHT, sha256: createHash('sha256').update(large).digest('hex') }
}

function pixels(severity: number): Uint8Array {
  const bytes = new Uint8Array(WIDTH * HEIGHT * 3)
  for (let at = 0; at < WIDTH * HEIGHT; at += 1)
    bytes.set(colourAt(at % WIDTH, Math.floor(at / WIDTH), severity), at * 3)
  return bytes
}

function colourAt(x: number, y: number, severity: number): readonly [number, number, number] {
  const distance = Math.hypot(x - WIDTH / 2, y - HEIGHT / 2)
  if (distance < 70) return [38, 50, 66]
  if (distance < 90) return [226, 232, 240]
  if (distance < 90 + 22 * severity) return [196, 84, 84]
  return (Math.floor((x + y) / STRIPE_PX) % 2 === 0 ? [206, 216, 228] : [188, 200, 214]) as [number, number, number]
}
