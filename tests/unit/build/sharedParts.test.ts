import { describe, expect, it } from 'vitest'
import { sharedParts } from '../../../build/sharedParts'

/** Each module by what it imports at once, and what it fetches when it is needed. */
type Table = Record<string, { imports?: string[], fetches?: string[] }>

const TABLE: Table = {
  'entry': { imports: ['vue', 'session'], fetches: ['/pages/c/[ref]/index.vue', '/layouts/field.vue', '/layouts/desk.vue', '/pages/van.vue'] },
  'vue': {},
  'session': { imports: ['vue'] },
  '/pages/c/[ref]/index.vue': { imports: ['card', 'stop weight', 'heading', 'session', 'photo'], fetches: ['heat', 'photo'] },
  '/layouts/field.vue': { imports: ['band', 'vue'] },
  '/layouts/desk.vue': { imports: ['band', 'menu'] },
  '/pages/van.vue': { imports: ['card', 'vans', 'stop weight'] },
  'card': { imports: ['vue', 'shape'] },
  'shape': {},
  'stop weight': { imports: ['mass'] },
  'mass': {},
  'heading': {},
  'photo': {},
  'band': {},
  'menu': {},
  'vans': {},
  'heat': { imports: ['catalogue'] },
  'catalogue': {},
}

function partsOf(table: Table): Record<string, string | undefined> {
  const part = sharedParts()
  const fetchersOf = (id: string) => Object.keys(table).filter(each => table[each]!.fetches?.includes(id))
  return Object.fromEntries(Object.keys(table).map(id => [id, part(id, {
    getModuleIds: () => Object.keys(table),
    getModuleInfo: each => ({ isEntry: each === 'entry', dynamicImporters: fetchersOf(each), importedIds: table[each]!.imports ?? [] }),
  })]))
}

describe('the file of what the cylinder page has in common with others', () => {
  const parts = partsOf(TABLE)
  const shared = Object.keys(parts).filter(id => parts[id] === 'shared')

  it('holds what other pages load too, with all that this takes', () => {
    expect(shared).toEqual(['card', 'shape', 'stop weight', 'mass', 'band'])
  })

  it.each([
    ['what the page has alone', 'heading'], ['what is in the entry', 'session'], ['what other pages have alone', 'vans'],
    ['what is fetched when it is needed', 'photo'], ['what only that takes', 'catalogue'], ['a screen itself', '/layouts/field.vue'],
  ])('does not hold %s', (_, id) => {
    expect(parts[id]).toBeUndefined()
  })

  it('is not made where the page lies elsewhere now, so that its weight cannot come back unseen', () => {
    const { '/pages/c/[ref]/index.vue': page, ...rest } = TABLE
    const fetches = ['/pages/cylinder.vue', '/layouts/field.vue', '/layouts/desk.vue', '/pages/van.vue']
    expect(() => partsOf({ ...rest, '/pages/cylinder.vue': page!, 'entry': { ...TABLE['entry'], fetches } })).toThrow('no screens any more')
  })
})
