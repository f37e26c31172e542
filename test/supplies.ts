import { v7 as uuidv7 } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { action, loader } from '#app/routes/supplies-act.tsx'
import { loader as historyLoader } from '#app/routes/supplies-history.tsx'
import { loader as orderLoader } from '#app/routes/supplies-order.ts'
import { answerOf, contextOf, site } from './people.ts'

/** The fields of a form about the stock, as often as each is sent. */
export type StockForm = Readonly<Record<string, string | readonly string[]>>

/** A whole form about the stock, opened by `user` just now: three suction catheters 12 Fr, at the store. */
export function aStockForm(user: CurrentUser, changes: StockForm = {}): StockForm {
  return {
    ...{ id: uuidv7(), openedBy: user.id, at: new Date().toISOString(), when: 'now' },
    ...{ item: 'catheter-12-fr', quantity: '3', from: 'store', to: 'store', reason: 'Weekly round' },
    ...changes,
  }
}

function argsOf(request: Request, user: CurrentUser) {
  return { request, url: new URL(request.url), context: contextOf(user) }
}

/** What comes of the pages of a ward's supplies. */
export const suppliesPages = {
  send(user: CurrentUser, wardId: string, act: string, form: StockForm) {
    const fields = Object.entries(form).flatMap(([name, value]) => [value].flat().map(one => [name, one]))
    const body = new URLSearchParams(fields)
    const url = `${site}/wards/${wardId}/supplies/${act}`
    const args = argsOf(new Request(url, { method: 'POST', body, headers: { Origin: site } }), user)
    return answerOf(() => action({ ...args, params: { wardId, act }, pattern: '/wards/:wardId/supplies/:act' }))
  },
  open(user: CurrentUser, wardId: string, act: string, search = '') {
    const args = argsOf(new Request(`${site}/wards/${wardId}/supplies/${act}${search}`), user)
    return answerOf(() => loader({ ...args, params: { wardId, act }, pattern: '/wards/:wardId/supplies/:act' }))
  },
  history(user: CurrentUser, wardId: string, search = '') {
    const args = argsOf(new Request(`${site}/wards/${wardId}/supplies/history${search}`), user)
    return answerOf(() => historyLoader({ ...args, params: { wardId }, pattern: '/wards/:wardId/supplies/history' }))
  },
  order(user: CurrentUser, wardId: string) {
    const args = argsOf(new Request(`${site}/wards/${wardId}/supplies/order.csv`), user)
    return answerOf(async () => {
      const file = await orderLoader({ ...args, params: { wardId }, pattern: '/wards/:wardId/supplies/order.csv' })
      return { status: file.status, type: file.headers.get('Content-Type'), text: await file.text() }
    })
  },
}
