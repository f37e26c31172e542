import { render, screen, within } from '@testing-library/react'
import { createRoutesStub } from 'react-router'
import { expect, test } from 'vitest'
import { DueTask } from '#app/components/due-task.tsx'
import { ErrorPage } from '#app/components/error-page.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { flangeWords } from '#app/components/flange.tsx'
import { AppPage } from '#app/components/page.tsx'
import { themeCookie, themeOf } from '#app/components/theme.ts'
import { WhenField } from '#app/components/when-field.tsx'

const now = new Date('2026-12-01T14:06:00Z')

function at(path: string, Component: () => React.ReactNode) {
  const Stub = createRoutesStub([{ path: '*', Component }])
  return render(<Stub initialEntries={[path]} />)
}

test('a page marks its section, tells the ward time, and goes back to itself after a change of colours', () => {
  at('/board?sort=bed', () => (
    <AppPage
      person={{ name: 'M. Achterberg', role: 'Charge nurse' }}
      now={now}
      zone="Europe/Zurich"
      theme="night"
      sections={[
        { label: 'Ward board', href: '/board', current: true },
        { label: 'Patients', href: '/patients', current: false },
      ]}
    >
      <h1>Ward board</h1>
    </AppPage>
  ))
  const sections = within(screen.getByRole('navigation', { name: 'Sections' }))
  expect(sections.getByRole('link', { current: 'page' })).toHaveTextContent('Ward board')
  expect(screen.getByText('15:06')).toHaveAttribute('datetime', '2026-12-01T14:06:00.000Z')
  expect(screen.getByDisplayValue('/board?sort=bed')).toHaveAttribute('name', 'back')
  expect(screen.getByRole('button', { name: 'Night', hidden: true })).toHaveAttribute('aria-pressed', 'true')
  expect(screen.getByText('Not an alarm. Keep monitors and call bell on.')).toBeVisible()
})

test.each([
  ['theme=night', 'night'],
  ['session=x; theme=day', 'day'],
  ['mytheme=night', 'system'],
  ['theme=purple', 'system'],
  [null, 'system'],
])('the cookie %s asks for the theme %s', (cookie, theme) => {
  expect(themeOf(cookie)).toBe(theme)
})

test('the theme that was set is the one that is read', () => {
  expect(themeOf(themeCookie('night').split(';')[0] ?? null)).toBe('night')
})

test('an error summary takes the focus and leads to the field', () => {
  render(
    <>
      <ErrorSummary errors={[{ fieldId: 'found', says: 'Enter the pressure found' }]} />
      <input id="found" aria-label="Pressure found" />
    </>,
  )
  expect(document.getElementById('errors')).toHaveFocus()
  expect(screen.getByRole('link', { name: 'Enter the pressure found' })).toHaveAttribute('href', '#found')
})

test('an unexpected error shows its reference and nothing of itself', () => {
  at('/', () => <ErrorPage error={new Error('ER_ACCESS_DENIED for root')} reference="7f3a" />)
  expect(screen.getByText('7f3a')).toBeVisible()
  expect(screen.queryByText(/ER_ACCESS/)).toBeNull()
})

test('a chart button says which care it charts, and late care comes with how late', () => {
  at('/', () => (
    <ul>
      <DueTask
        task={{
          name: 'cuff-pressure-check',
          title: 'Cuff pressure',
          detail: 'Every 8 hours. Last 26 cmH2O at 05:30',
          status: 'overdue',
          says: '36 min late',
          chart: { href: '/chart', words: 'Chart pressure' },
        }}
      />
    </ul>
  ))
  expect(screen.getByRole('link', { name: 'Chart pressure, Cuff pressure' })).toHaveAttribute('href', '/chart')
  expect(screen.getByText('36 min late')).toBeVisible()
})

test('when starts with now, and offers the last days by the ward clock', () => {
  render(<WhenField now={new Date('2026-12-01T23:30:00Z')} zone="Europe/Zurich" daysBack={2} />)
  expect(screen.getByRole('radio', { name: 'Now, 00:30' })).toBeChecked()
  const days = screen.getByLabelText<HTMLSelectElement>('Day')
  expect([...days.options].map(day => day.text)).toEqual([
    'Today, 02-Dec-2026',
    'Yesterday, 01-Dec-2026',
    'Mon 30-Nov-2026',
  ])
})

test('the neck plate is told in words, with what it has no room for', () => {
  expect(
    flangeWords({ idMm: 6.5, idWithoutInnerMm: 8, odMm: 11.3, label: '8.0 ISO 5366', cuff: 'air-filled cuff' }),
  ).toBe(
    'Neck plate printed 8.0 ISO 5366, inner diameter 6.5 mm, 8.0 mm without the inner cannula, outer diameter 11.3 mm, air-filled cuff',
  )
})
