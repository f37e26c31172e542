import { careFields, note } from '../field.ts'
import { charted } from '../kind.ts'

/** Notes: ask a record with this. Rules read nothing from them. */
export const freeNotes = charted({
  slug: 'free-note',
  schema: careFields({ words: note({ label: 'Note', hint: 'What no other form holds. Rules do not read it' }) }),
})
