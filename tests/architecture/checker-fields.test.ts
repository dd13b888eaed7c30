import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import type { z } from 'zod'
import { DETAILS } from '../../utils/custody/schema'

/** The table of fields of the checker that stands alone, kind by kind; those that must be there with an exclamation mark. */
function fieldsOfChecker(): Record<string, string[]> {
  const table = /const FIELDS = \{\n([\s\S]*?)\n\}/.exec(readFileSync('public/check-custody-log.mjs', 'utf8'))![1]!
  return Object.fromEntries([...table.matchAll(/'([a-z-]+)': '([^']*)'/g)].map(([, kind, fields]) => [kind!, fields!.split(' ').sort()]))
}

type Shape = Record<string, z.ZodType>
type Form = { shape: Shape } | { options: readonly Form[] }

/** The fields of a form, and of one that takes several shapes those of all; only what each of them asks for must be there. */
function fieldsOf(form: Form): string[] {
  const shapes = 'shape' in form ? [form.shape] : form.options.map(one => (one as { shape: Shape }).shape)
  const names = [...new Set(shapes.flatMap(shape => Object.keys(shape)))]
  return names.map(name => shapes.every(shape => shape[name]?.safeParse(undefined).success === false) ? `${name}!` : name).sort()
}

describe('the checker that reads an export with nothing but Node', () => {
  // What it does not know it takes for no details at all, and then finds another net than the log.
  it('knows every field of every kind, and which must be there', () => {
    const fields = Object.fromEntries(Object.entries(DETAILS).map(([kind, form]) => [kind, fieldsOf(form as unknown as Form)]))
    expect(fieldsOfChecker()).toEqual(fields)
  })
})
