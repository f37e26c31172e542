import { type RefObject, useEffect, useState } from 'react'
import type { DrawnField } from './conform-fields.ts'

/** What has been answered so far, by bare field name. */
export type Answers = Readonly<Record<string, readonly string[]>>

/** Names of the fields that others depend on: by `when`, or for their unit. */
function watchedNames(fields: readonly DrawnField[]): readonly string[] {
  const names = fields.flatMap(({ meta }) => [
    ...(meta.when ? [meta.when.field] : []),
    ...('unitField' in meta && meta.unitField !== undefined ? [meta.unitField] : []),
  ])
  return [...new Set(names)]
}

/** The answers that other fields depend on, kept as the form around `inside` is filled in. */
export function useAnswers(fields: readonly DrawnField[], inside: RefObject<HTMLElement | null>): Answers {
  const watched = fields.filter(field => watchedNames(fields).includes(field.name))
  const atFirst = Object.fromEntries(watched.map(field => [field.name, field.answers]))
  const [answers, setAnswers] = useState<Answers>(atFirst)
  const fullNames = watched.map(field => `${field.name} ${field.fullName}`).join('\n')
  useEffect(() => {
    const form = inside.current?.closest('form')
    if (!form || fullNames === '') return
    const read = () => {
      const data = new FormData(form)
      const entries = fullNames.split('\n').map(line => {
        const [name = '', fullName = ''] = line.split(' ')
        return [name, data.getAll(fullName).filter(value => typeof value === 'string')] as const
      })
      const next = Object.fromEntries(entries)
      setAnswers(before => (JSON.stringify(before) === JSON.stringify(next) ? before : next))
    }
    read()
    form.addEventListener('input', read)
    return () => form.removeEventListener('input', read)
  }, [inside, fullNames])
  return answers
}
