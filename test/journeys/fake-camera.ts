import { writeFile } from 'node:fs/promises'
import { toBuffer } from 'bwip-js/node'
import sharp, { type Sharp } from 'sharp'

const [WIDTH, HEIGHT] = [640, 480]
const A_SECOND = 10 // frames
const GREY = Buffer.alloc((WIDTH * HEIGHT) / 2, 128) // both colour planes, a quarter of the size each

/**
 * A film for a browser that takes it for what its camera sees, over and over: for a second a table without a code, then for three
 * seconds this label as a GS1 DataMatrix, brackets as printed.
 */
export async function filmedLabel(file: string, label: string): Promise<void> {
  const empty = await frame(sharp({ create: { width: WIDTH, height: HEIGHT, channels: 3, background: '#d8d4cc' } }))
  const symbol = await toBuffer({
    bcid: 'gs1datamatrix',
    text: label,
    scale: 8,
    padding: 12,
    backgroundcolor: 'FFFFFF',
  })
  const seen = await frame(sharp(symbol).resize(WIDTH, HEIGHT, { fit: 'contain', background: '#d8d4cc' }))
  const frames = [...Array<Buffer>(A_SECOND).fill(empty), ...Array<Buffer>(3 * A_SECOND).fill(seen)]
  const head = Buffer.from(`YUV4MPEG2 W${WIDTH} H${HEIGHT} F${A_SECOND}:1 Ip A1:1 C420mpeg2\n`)
  await writeFile(file, Buffer.concat([head, ...frames]))
}

async function frame(picture: Sharp): Promise<Buffer> {
  const brightness = await picture.flatten().toColourspace('b-w').raw().toBuffer()
  return Buffer.concat([Buffer.from('FRAME\n'), brightness, GREY])
}
