import type { AnySetting, SettingValue } from './policy.ts'

/** A setting's value as typed, read; or what is wrong with it. */
export type ReadValue =
  | { readonly ok: true; readonly value: SettingValue }
  | { readonly ok: false; readonly problem: string }

const MOST_IN_A_LIST = 40
const NUMBER = /^-?\d{1,6}(?:[.,]\d{1,3})?$/

/** Reads what somebody typed for a setting, within its allowed range. A decimal comma is a point; a list is separated by commas or spaces. */
export function readSettingValue(setting: AnySetting, typed: string): ReadValue {
  const text = typed.trim()
  if (typeof setting.default === 'boolean') return readSwitch(text)
  if (typeof setting.default === 'number') return readNumber(setting, text)
  return readList(text)
}

function readSwitch(text: string): ReadValue {
  if (text === 'on' || text === 'off') return { ok: true, value: text === 'on' }
  return { ok: false, problem: 'Choose on or off' }
}

function readNumber({ min, max, unit }: AnySetting, text: string): ReadValue {
  if (!NUMBER.test(text)) return { ok: false, problem: `Enter a number of ${unit}` }
  const value = Number(text.replace(',', '.'))
  if ((min !== undefined && value < min) || (max !== undefined && value > max))
    return { ok: false, problem: `Enter a number from ${min} to ${max} ${unit}` }
  return { ok: true, value }
}

function readList(text: string): ReadValue {
  const parts = text.split(/[\s,;]+/).filter(Boolean)
  if (parts.length === 0) return { ok: false, problem: 'Enter at least one number' }
  if (parts.length > MOST_IN_A_LIST) return { ok: false, problem: `Enter at most ${MOST_IN_A_LIST} numbers` }
  const wrong = parts.find(part => !/^\d{1,4}(?:\.\d)?$/.test(part) || Number(part) <= 0)
  if (wrong !== undefined) return { ok: false, problem: `Enter ${wrong} as a number above 0` }
  return { ok: true, value: [...new Set(parts.map(Number))].sort((a, b) => a - b) }
}

/** A value as it stands in the field where it is typed. */
export function typedValue(value: SettingValue): string {
  if (typeof value === 'boolean') return value ? 'on' : 'off'
  return typeof value === 'number' ? String(value) : value.join(', ')
}

/** Whether two values of a setting are the same. */
export function isSameValue(a: SettingValue, b: SettingValue): boolean {
  return typedValue(a) === typedValue(b)
}
