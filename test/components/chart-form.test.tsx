import { configure, render, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import {
  type ActionFunction,
  createRoutesStub,
  data,
  UNSAFE_ErrorResponseImpl as ErrorResponseImpl,
} from 'react-router'
import { expect, test, vi } from 'vitest'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import type { ChartAnswer } from '#app/charting/chart-answer.ts'
import { ChartForm, type ChartFormProps } from '#app/components/chart-form.tsx'
import { UsualAct } from '#app/components/chart-head.tsx'
import { answerOrKept } from '#app/components/kept-form.ts'

// The warnings wait until typing rests, and a loaded machine types slowly.
configure({ asyncUtilTimeout: 10_000 })
vi.setConfig({ testTimeout: 30_000 })

const now = new Date('2026-03-10T14:06:30.000Z')
const signer = { id: '01939d4e-0000-7000-8000-000000000002', name: 'R. Osei', role: 'respiratory therapist' }

const view: ChartFormProps['view'] = {
  id: '01939d4e-0000-7000-8000-000000000001',
  signer,
  signing: { password: false, email: 'r.osei@ward.example', second: 'offered', lacks: null },
  calendar: { zone: 'Europe/London', now, beganAt: new Date('2026-03-01T08:00:00.000Z'), endedAt: null },
  typed: { 'care.unit': ['cmH2O'] },
  gauges: [],
  notOffered: {},
  lists: { task: {}, setting: {}, warning: {} },
  units: {},
  witnesses: {},
  daysBack: 9,
}

const warned: ChartAnswer = {
  is: 'previewed',
  warnings: [{ name: 'cuff-high', level: 'amber', action: 'Let air out slowly.', cause: 'Above 30 cmH2O.' }],
}

/** What was sent, form by form; the answer to each is made from what its button says. */
function opened(answerTo: (sent: FormData) => unknown = () => warned) {
  window.matchMedia = vi.fn().mockReturnValue({ matches: false })
  const sent: FormData[] = []
  const action: ActionFunction = ({ request }) =>
    answerOrKept(async () => {
      const form = await request.formData()
      sent.push(form)
      return answerTo(form)
    })
  const Stub = createRoutesStub([{ path: '/', action, Component: Page }])
  render(<Stub />)
  return { sent, charted: () => sent.filter(form => form.get('intent') === null) }
}

function Page({ actionData }: { readonly actionData?: unknown }) {
  return (
    <ChartForm
      kind={cuffPressure}
      view={view}
      answer={actionData as ChartAnswer | undefined}
      words="Chart pressure"
      cancelHref="/patients/1"
      reasonAfterHours={24}
    >
      {fill => <UsualAct words="By manometer" onFill={() => fill({ 'care.method': ['manometer'] })} />}
    </ChartForm>
  )
}

const user = userEvent.setup()
const pressure = () => screen.getByRole('textbox', { name: 'Pressure found' })
const type = (text: string) => user.type(pressure(), text)
const tap = (name: string) => user.click(screen.getByLabelText(name))
const press = () => user.click(screen.getByRole('button', { name: /^Chart(ing| pressure)$/ }))

test('the bar says what is still needed, then the sentence, then the warning', async () => {
  opened()
  expect(await screen.findByText('Still needed: pressure found, method.')).toBeVisible()
  await type('34')
  expect(screen.getByText('Still needed: method.')).toBeVisible()
  await tap('Manometer')
  expect(
    screen.getByText('14:06 Cuff pressure 34 cmH2O by manometer, not adjusted. R. Osei, respiratory therapist.'),
  ).toBeVisible()
  expect(await screen.findAllByText('Let air out slowly.')).toHaveLength(2)
})

test('looking ahead asks with the whole form, and charts nothing', async () => {
  const { sent, charted } = opened()
  await type('34')
  await tap('Manometer')
  await waitFor(() => expect(sent.at(-1)?.get('intent')).toBe('preview'))
  expect(Object.fromEntries(sent.at(-1) ?? [])).toMatchObject({ id: view.id, openedBy: signer.id, 'care.found': '34' })
  expect(charted()).toEqual([])
})

test('the usual act fills in what need not be looked at, as if it had been tapped', async () => {
  opened()
  await user.click(screen.getByRole('button', { name: 'As usual: By manometer' }))
  expect(screen.getByLabelText('Manometer')).toBeChecked()
  expect(screen.getByText('Still needed: pressure found.')).toBeVisible()
})

test('a form sent twice says the same twice', async () => {
  const { charted } = opened(form => (form.get('intent') === 'preview' ? warned : data(null, 500)))
  await type('26')
  await tap('Manometer')
  await press()
  await waitFor(() => expect(charted()).toHaveLength(1))
  await press()
  await waitFor(() => expect(charted()).toHaveLength(2))
  const [first, second] = charted().map(form => Object.fromEntries(form))
  expect(second).toEqual(first)
  expect(first).toMatchObject({ at: now.toISOString(), when: 'now' })
})

test('mistakes are summed up with the focus on them, and one goes when its field is changed', async () => {
  const refused: ChartAnswer = {
    is: 'refused',
    title: 'Not charted yet. Please check:',
    errors: { 'care.method': ['Choose the method'], 'care.found': ['Enter the pressure found'] },
    asks: false,
    typed: view.typed,
    id: view.id,
    signer,
  }
  opened(() => data(refused, 400))
  await press()
  const summary = await screen.findByText('Not charted yet. Please check:')
  expect(summary.closest('#errors')).toHaveFocus()
  const links = screen.getAllByRole('link', { name: /pressure found|method/ })
  expect(links.map(link => link.getAttribute('href'))).toEqual(['#care-found', '#care-method'])
  expect(screen.getAllByText('Choose the method')).toHaveLength(2)
  await tap('Manometer')
  expect(screen.getAllByText('Choose the method')).toHaveLength(1)
})

test.each([
  [503, /^Nothing was charted/],
  [504, /it is charted once/],
])('an answer of %i leaves everything typed and says so', async (status, words) => {
  opened(form => {
    if (form.get('intent') === 'preview') return warned
    // What a server action's own `data()` arrives as.
    throw new ErrorResponseImpl(status, '', '')
  })
  await type('26')
  await tap('Manometer')
  await press()
  expect(await screen.findByText(words)).toBeVisible()
  expect(pressure()).toHaveValue('26')
  expect(screen.getByLabelText('Manometer')).toBeChecked()
})

test('where no answer came, nobody is told that nothing was charted', async () => {
  opened(form => {
    if (form.get('intent') === 'preview') return warned
    throw new TypeError('Failed to fetch')
  })
  await type('26')
  await tap('Manometer')
  await press()
  expect(await screen.findByText(/not known yet whether this was charted/)).toBeVisible()
  expect(screen.queryByText(/Nothing was charted/)).toBeNull()
})
