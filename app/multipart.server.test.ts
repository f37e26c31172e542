import fc from 'fast-check'
import { expect, test } from 'vitest'
import { type FormLimits, multipartForm, TooMuchText } from './multipart.server.ts'

const ample: FormLimits = { fileBytes: 100_000, files: 10, textBytes: 100_000 }

/** A request whose body arrives in chunks of this many bytes. */
function arriving(type: string, bytes: Uint8Array, chunk: number): Request {
  let at = 0
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      if (at >= bytes.length) return controller.close()
      controller.enqueue(bytes.slice(at, at + chunk))
      at += chunk
    },
  })
  return new Request('http://x/', {
    method: 'POST',
    headers: { 'Content-Type': type },
    body,
    duplex: 'half',
  } as RequestInit)
}

async function written(form: FormData) {
  const request = new Request('http://x/', { method: 'POST', body: form })
  return { type: request.headers.get('Content-Type') ?? '', bytes: new Uint8Array(await request.arrayBuffer()) }
}

const told = (form: FormData) =>
  Promise.all(
    [...form].map(async ([name, value]) =>
      typeof value === 'string'
        ? [name, value]
        : [name, value.name, value.type, Buffer.from(await value.arrayBuffer()).toString('hex')],
    ),
  )

// Boundaries, line breaks and quotation marks are what a reader stumbles over.
const awkward = ['a', 'ä', '-', '--', '\r\n', '\r', '\n', '"', '%', ';', '😀', ' ']
const aName = fc.string({ unit: fc.constantFrom(...awkward), minLength: 1, maxLength: 30 })
const aValue = fc.string({ unit: fc.constantFrom(...awkward, '\0'), maxLength: 30 })
const part = fc.tuple(aName, fc.oneof(aValue, fc.record({ name: aName, bytes: fc.uint8Array({ maxLength: 200 }) })))

test('whatever a form holds, in whatever pieces it arrives, it is read as the platform reads it', async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(part, { maxLength: 5 }), fc.integer({ min: 1, max: 50 }), async (parts, chunk) => {
      const form = new FormData()
      for (const [name, value] of parts) {
        if (typeof value === 'string') form.append(name, value)
        else form.append(name, new File([value.bytes], value.name, { type: 'image/png' }))
      }
      const { type, bytes } = await written(form)
      const theirs = await arriving(type, bytes, bytes.length).formData()
      expect(await told(await multipartForm(arriving(type, bytes, chunk), ample))).toEqual(await told(theirs))
    }),
    { numRuns: 200 },
  )
})

test('a file too large is cut off one byte past its limit, one too many is empty, and what was typed is whole', async () => {
  const form = new FormData()
  form.append('before', 'typed first')
  for (const name of ['a.jpg', 'b.jpg', 'c.jpg']) form.append('pictures', new File(['x'.repeat(5000)], name))
  form.append('after', 'typed last')
  const { type, bytes } = await written(form)
  const read = await multipartForm(arriving(type, bytes, 100), { fileBytes: 1000, files: 2, textBytes: 100 })
  expect(read.getAll('pictures').map(file => (file as File).size)).toEqual([1001, 1001, 0])
  expect([read.get('before'), read.get('after')]).toEqual(['typed first', 'typed last'])
})

test('more text than any form has is refused while it arrives', async () => {
  const form = new FormData()
  form.append('note', 'x'.repeat(2000))
  const { type, bytes } = await written(form)
  await expect(multipartForm(arriving(type, bytes, 100), { ...ample, textBytes: 1000 })).rejects.toThrow(TooMuchText)
})

test.each([
  ['cut off', 'multipart/form-data; boundary=b', '--b\r\nContent-Disposition: form-data; name="a"\r\n\r\n1'],
  ['without a boundary', 'multipart/form-data', '--b--'],
  [
    'of another boundary',
    'multipart/form-data; boundary=c',
    '--b\r\nContent-Disposition: form-data; name="a"\r\n\r\n1\r\n--b--',
  ],
  ['with a head that does not end', 'multipart/form-data; boundary=b', `--b\r\n${'x'.repeat(20_000)}`],
  ['empty', 'multipart/form-data; boundary=b', ''],
])('a body %s is no form', async (_, type, text) => {
  await expect(multipartForm(arriving(type, Buffer.from(text), 7), ample)).rejects.toThrow(TypeError)
})
