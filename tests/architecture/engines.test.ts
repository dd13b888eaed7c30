import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { describe, expect, it } from 'vitest'

const { satisfies } = createRequire(import.meta.url)('semver') as { satisfies: (version: string, range: string) => boolean }

/** The oldest that package.json asks for, and later ones of that line. */
const NODES = ['20.19.0', '20.20.2']

type Packages = Record<string, { engines?: { node?: string }, version?: string, resolved?: string }>

const lock = JSON.parse(readFileSync('package-lock.json', 'utf8')) as { packages: Packages }

/** Packages that refuse one of our Nodes. */
function refusing(packages: Packages): string[] {
  return Object.entries(packages).flatMap(([name, { engines }]) => {
    const range = engines?.node
    return range && NODES.some(node => !satisfies(node, range)) ? [`${name} asks for ${range}`] : []
  })
}

describe('the packages of the lock file', () => {
  it('all run on Node 20.19 and later of that line', () => {
    expect(Object.keys(lock.packages).length).toBeGreaterThan(500)
    expect(refusing(lock.packages)).toEqual([])
  })

  it('record no address, so that any registry serves them', () => {
    expect(Object.entries(lock.packages).filter(([, { resolved }]) => resolved).map(([name]) => name)).toEqual([])
  })
})

describe('the guard itself', () => {
  it('finds a package that asks for a later Node', () => {
    const packages = { a: { engines: { node: '>=22' } }, b: { engines: { node: '^20.20.0 || >=22' } }, c: { engines: { node: '>=18' } }, d: {} }
    expect(refusing(packages)).toEqual(['a asks for >=22', 'b asks for ^20.20.0 || >=22'])
  })
})
