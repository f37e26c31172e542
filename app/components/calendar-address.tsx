import { Form } from 'react-router'
import { Button } from './button.tsx'
import { Card } from './card.tsx'

interface CalendarAddressProps {
  /** Day on which the present address was made; null while there is none. */
  readonly since: string | null
  /** An address that was made just now: it is shown once. */
  readonly address: string | null
}

/** The days of this page for a calendar program, at an address of one's own that can be ended. */
export function CalendarAddress({ since, address }: CalendarAddressProps) {
  return (
    <Card title="In your calendar">
      <div className="grid max-w-prose gap-3">
        <p>
          A calendar program can follow planned changes and change-by days. It shows bed and initials, no names. Whoever
          has the address can read it: keep it to yourself, and end it when a device is lost.
        </p>
        <div role="status" className="empty:hidden">
          {address && (
            <>
              <label htmlFor="calendar-address" className="font-semibold">
                Your address, shown this once
              </label>
              <input
                id="calendar-address"
                readOnly
                value={address}
                className="mt-1 min-h-12 w-full rounded-control border border-edge bg-surface px-3"
              />
            </>
          )}
        </div>
        {since && <p className="text-ink2">Your address was made on {since}. A new one ends it.</p>}
        <Form method="post" className="flex flex-wrap gap-3">
          <Button name="step" value="make" size={48}>
            {since ? 'Make a new address' : 'Make an address'}
          </Button>
          {since && (
            <Button name="step" value="end" size={48} variant="danger">
              End the address
            </Button>
          )}
        </Form>
      </div>
    </Card>
  )
}
