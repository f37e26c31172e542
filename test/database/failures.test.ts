import { createStaticHandler, RouterContextProvider } from 'react-router'
import { beforeAll, expect, test, vi } from 'vitest'
import { handleError } from '#app/entry.server.tsx'
import { DatabaseUnavailable } from '#database/errors.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { migrated } from '#test/database.ts'

beforeAll(migrated)

const wrong = `SELECT no_such_column FROM wards WHERE name = 'Margaret Example'`

test('a failure is logged by name, code and place, without a word of the statement', async () => {
  const refused = await sequelize.query(wrong).catch(error => error)
  vi.mocked(console.error).mockImplementation(() => {})
  handleError(refused, {
    request: new Request('http://localhost/'),
    params: {},
    context: new RouterContextProvider(),
  })
  const [line] = vi.mocked(console.error).mock.calls[0] ?? []
  vi.mocked(console.error).mockClear()
  expect(JSON.parse(line)).toMatchObject({
    failed: 'SequelizeDatabaseError',
    code: 'ER_BAD_FIELD_ERROR',
    requestId: 'development',
  })
  expect(line).not.toMatch(/Margaret|SELECT/)
})

test.each([
  ['before anything was saved', false, 503],
  ['while something was being saved', true, 504],
])('a database lost %s is answered as such by any route', async (_when, committing, status) => {
  const handler = createStaticHandler([
    {
      id: 'route',
      path: '/',
      loader() {
        throw new DatabaseUnavailable(new Error('ECONNREFUSED'), committing)
      },
    },
  ])
  const context = await handler.query(new Request('http://localhost/'))
  expect(context).toMatchObject({ statusCode: status, errors: { route: { status } } })
})
