/**
 * Hands in what was typed on this page and goes to the sign-in page, unless the session turns out to be in use on another
 * page: then false. `canBeElsewhere` is false at the end that nobody can put off. Without a network the page leaves as well:
 * a screen that nobody watches must not go on showing a patient.
 */
export async function handIn(canBeElsewhere: boolean): Promise<boolean> {
  const form = typedForm()
  const body = form === null ? new URLSearchParams() : textsOf(form)
  const path = new URL(form?.action ?? window.location.href).pathname
  body.set('draft-path', path)
  const answer = await fetch('/draft', { method: 'POST', body }).catch(() => null)
  const { ended, kept } = await outcomeOf(answer)
  if (!ended && canBeElsewhere) return false
  const returnTo = window.location.pathname + window.location.search
  window.location.replace(`/sign-in?${new URLSearchParams({ returnTo, ...(kept ? { kept: 'yes' } : {}) })}`)
  return true
}

async function outcomeOf(answer: Response | null): Promise<{ ended: boolean; kept: boolean }> {
  if (answer === null || !answer.ok) return { ended: true, kept: false }
  return answer.json()
}

/** The form in which something differs from what the page came with. */
function typedForm(): HTMLFormElement | null {
  const forms = [...document.querySelectorAll<HTMLFormElement>('main form')]
  return forms.find(form => form.method === 'post' && [...form.elements].some(isTyped)) ?? null
}

function isTyped(control: Element): boolean {
  if (control instanceof HTMLTextAreaElement) return control.value !== control.defaultValue
  if (control instanceof HTMLSelectElement)
    return [...control.options].some(option => option.selected !== option.defaultSelected)
  if (!(control instanceof HTMLInputElement) || control.type === 'hidden') return false
  return control.type === 'radio' || control.type === 'checkbox'
    ? control.checked !== control.defaultChecked
    : control.value !== control.defaultValue
}

function textsOf(form: HTMLFormElement): URLSearchParams {
  const texts = new URLSearchParams()
  for (const [name, value] of new FormData(form)) if (typeof value === 'string') texts.append(name, value)
  return texts
}
