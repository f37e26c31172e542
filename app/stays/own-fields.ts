/**
 * The fields of a form that it ought to have, as text; files and foreign names are left out. Names are compared before
 * anything takes them for paths, since `a.__proto__` or `a[9999999]` would be followed.
 */
export function onlyFields(sent: FormData, names: readonly string[]): FormData {
  const form = new FormData()
  for (const [name, value] of sent) if (typeof value === 'string' && names.includes(name)) form.append(name, value)
  return form
}
