import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { projectFiles } from '../helpers/sources'

/** Folders of tests/ that hold what tests need, and no tests. */
const WITHOUT_TESTS = ['helpers']

/** The folders whose tests the configuration of vitest runs. */
function projectsOf(configuration: string): string[] {
  return [
    ...[...configuration.matchAll(/^\s*nodeProject\('(\w+)'/gm)].map(match => match[1] ?? ''),
    ...[...configuration.matchAll(/include: \['tests\/(\w+)\/\*\*\/\*\.test\.ts'\]/g)].map(match => match[1] ?? ''),
  ]
}

/** Test files that no project would run. */
function strays(files: string[], projects: string[]): string[] {
  return files.filter((file) => {
    const [top, project = ''] = file.split('/')
    return !(top === 'tests' && projects.includes(project) && file.endsWith('.test.ts'))
  })
}

/** Whether a test puts something else in the place of a module, a global or the clock, and could leave it there. */
const replaces = (source: string) => /\bvi\.(mock|doMock|stub\w+|spyOn|useFakeTimers|setSystemTime|resetModules)\b|\bglobalThis\.\w+ = |\bprocess\.(env\.\w+ = |chdir\b)/.test(source)

const projects = projectsOf(readFileSync('vitest.config.ts', 'utf8'))

describe('every test', () => {
  const files = projectFiles(/\.(test|spec|e2e)\.[cm]?[jt]sx?$/)

  it('stands in a project, so that it is run', () => {
    expect(projects).toEqual(expect.arrayContaining(['architecture', 'unit', 'server', 'component']))
    expect(files.length).toBeGreaterThan(20)
    expect(strays(files, projects)).toEqual([])
  })

  it('is all that its folder is for: no folder of tests/ is without a project', () => {
    const folders = new Set(projectFiles(/./, 'tests').map(file => file.split('/')[1] ?? ''))
    expect([...folders].filter(folder => !projects.includes(folder) && !WITHOUT_TESTS.includes(folder))).toEqual([])
  })

  it('is run whole: none is left marked to run alone or to be passed over', () => {
    const marked = files.filter(file => file !== 'tests/architecture/test-projects.test.ts' && /\b(it|test|describe)\.(only|skip|todo)\b/.test(readFileSync(file, 'utf8')))
    expect(marked).toEqual([])
  })

  it('of what is pure leaves everything as it was, for the next one in its process', () => {
    const pure = files.filter(file => /^tests\/(unit|reference)\//.test(file))
    expect(pure.length).toBeGreaterThan(100)
    expect(pure.filter(file => replaces(readFileSync(file, 'utf8')))).toEqual([])
  })
})

describe('the guard itself', () => {
  it('finds a test that nobody runs', () => {
    const files = ['utils/mass.test.ts', 'tests/mass.test.ts', 'tests/helpers/a.test.ts', 'tests/unit/a.spec.ts', 'tests/unit/a.test.mjs', 'tests/unit/deep/a.test.ts']
    expect(strays(files, ['unit'])).toEqual(files.slice(0, -1))
  })

  it('finds what a test puts in the place of something else', () => {
    expect(['vi.mock(\'./a\')', 'vi.doMock(\'./a\')', 'vi.stubGlobal(\'fetch\', no)', 'vi.useFakeTimers()', 'globalThis.fetch = no', 'process.env.TZ = \'UTC\''].filter(line => !replaces(line))).toEqual([])
    expect(['const told = vi.fn()', 'const { TZ } = process.env', 'globalThis.crypto.randomUUID()'].filter(replaces)).toEqual([])
  })

  it('does not take a project out of a comment', () => {
    expect(projectsOf('      // nodeProject(\'bench\'),\n      nodeProject(\'unit\'),')).toEqual(['unit'])
  })
})
