import { describe, expect, it } from 'vitest'
import { importsOf, projectFiles, type Import } from '../helpers/sources'

/** The schemas' package: what reads it is for the server, or fetched once it is needed. */
const SCHEMAS = 'package:zod'
const SOURCES = /\.(ts|vue)$/
const SCREENS = ['components', 'composables', 'stores', 'layouts', 'pages', 'middleware', 'plugins']

const files = projectFiles(SOURCES)
const imports = new Map(files.map(file => [file, importsOf(file)]))

/** How a file reaches a package at once, from file to file; null where it does not. */
function way(from: string, to: string, all: ReadonlyMap<string, Import[]>): string[] | null {
  const seen = new Set<string>()
  const look = (file: string): string[] | null => {
    if (seen.has(file)) return null
    seen.add(file)
    for (const { to: next, typeOnly, isLazy } of all.get(file) ?? []) {
      if (typeOnly || isLazy) continue
      if (next === to) return [file]
      const [source] = [next, `${next}.ts`, `${next}.vue`, `${next}/index.ts`].filter(path => all.has(path))
      const rest = source ? look(source) : null
      if (rest) return [file, ...rest]
    }
    return null
  }
  return look(from)
}

describe('what a screen loads at once', () => {
  const screens = files.filter(file => SCREENS.includes(file.split('/')[0] ?? ''))

  it('has no schemas in it: types and figures stand beside them', () => {
    expect(screens.length).toBeGreaterThan(200)
    expect(screens.flatMap(file => way(file, SCHEMAS, imports)?.join(' > ') ?? [])).toEqual([])
  })
})

describe('the guard itself', () => {
  const planted = (screen: string) => new Map([
    ['pages/now.vue', importsOf('pages/now.vue', `<script setup lang="ts">\n${screen}\n</script>`)],
    ['utils/contract/now.ts', importsOf('utils/contract/now.ts', 'import { z } from \'zod\'\nexport const MOST = 3')],
  ])

  it.each([
    'import { MOST } from \'~~/utils/contract/now\'',
    'import { MOST, type NowAnswer } from \'../utils/contract/now\'',
  ])('finds what is reached by %s', (source) => {
    expect(way('pages/now.vue', SCHEMAS, planted(source))).toEqual(['pages/now.vue', 'utils/contract/now.ts'])
  })

  it.each([
    'import type { NowAnswer } from \'~~/utils/contract/now\'',
    'const { MOST } = await import(\'~~/utils/contract/now\')',
  ])('lets pass %s', (source) => {
    expect(way('pages/now.vue', SCHEMAS, planted(source))).toBeNull()
  })
})
