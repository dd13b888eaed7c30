import { describe, expect, it } from 'vitest'
import { importsOf, projectFiles, type Import } from '../helpers/sources'

/** Folders of utils/ and the other folders of utils/ that each may import. None may import what imports it. */
const PURE: Record<string, readonly string[]> = {
  quantity: [],
  address: [],
  access: [],
  label: [],
  refrigerant: ['quantity'],
  requalification: ['quantity'],
  capacity: ['quantity', 'refrigerant', 'requalification'],
  recovery: ['quantity', 'refrigerant', 'address'],
  custody: ['quantity', 'refrigerant', 'requalification', 'capacity', 'recovery', 'access', 'label', 'registration'],
  photo: ['quantity'],
  dock: ['quantity', 'label'],
  registration: ['quantity', 'refrigerant', 'requalification', 'capacity', 'custody', 'label'],
  reclaim: ['quantity', 'requalification', 'capacity', 'custody'],
  settlement: ['quantity', 'photo', 'reclaim', 'dock'],
  transport: ['quantity', 'refrigerant', 'custody', 'picture'],
  contract: ['quantity', 'refrigerant', 'requalification', 'capacity', 'recovery', 'photo', 'custody', 'access', 'label', 'reclaim', 'dock', 'settlement', 'transport'],
}

/** What else in utils/ draws, prints and plans: all of the above. */
const ABOVE = Object.keys(PURE)

/** Packages that pure modules may use; none reaches a clock, a disk or a screen. */
const PURE_PACKAGES = new Set(['zod', 'qrcode', 'canonicalize'])

const SCREEN = ['components', 'composables', 'stores', 'layouts', 'pages', 'middleware', 'plugins', 'assets']

/** Top folders and the top folders that each may import. */
const TOP: Record<string, readonly string[]> = {
  'build': [],
  'types': [],
  'service-worker': [],
  'drizzle': ['utils'],
  'server/api': ['server/utils', 'utils'],
  'server/routes': ['server/utils', 'utils'],
  'server/middleware': ['server/utils', 'utils'],
  'server/plugins': ['server/utils', 'utils'],
  'server/tasks': ['server/utils', 'utils'],
  // The version is read from package.json.
  'server/utils': ['drizzle', 'utils', 'package.json'],
  'composables': ['utils', 'stores'],
  // A store asks the server through the one composable that does.
  'stores': ['utils', 'composables'],
  'components': ['utils'],
  'layouts': ['utils', ...SCREEN],
  'pages': ['utils', ...SCREEN],
  'middleware': ['utils', ...SCREEN],
  'plugins': ['utils', ...SCREEN],
}

/** Packages that would bring the server into the browser, or a screen into the server. */
const SERVER_ONLY = /^package:(node:|fs$|path$|crypto$|@libsql\/|drizzle-orm|nodemailer|pdfkit|h3$|nitropack|unstorage)/
const SCREEN_ONLY = /^package:(vue|@vue\/|@vueuse\/|pinia|vue-router|vue-qrcode-reader|@tanstack\/|#app|zxing-wasm)/

const SOURCES = /\.(ts|mts|vue)$/

/** What is wrong with an import, or null. */
function fault(from: string, to: string): string | null {
  const zone = zoneOf(from)
  if (!zone) return null
  if (to === '(computed)') return 'loads a module whose name is computed'
  if (to.startsWith('package:')) return packageFault(zone, to)
  const target = zoneOf(to) ?? to
  if (zone === 'utils') return target === 'utils' ? pureFault(from, to) : `utils may not import ${target}`
  if (target === zone || TOP[zone]?.includes(target)) return null
  return `${zone} may not import ${target}`
}

function packageFault(zone: string, to: string): string | null {
  const name = to.slice('package:'.length)
  if (zone === 'utils') return PURE_PACKAGES.has(name.split('/')[0] ?? '') ? null : `utils may not import the package ${name}`
  if (SCREEN.includes(zone) && SERVER_ONLY.test(to)) return `${zone} may not import the server's package ${name}`
  if (zone.startsWith('server/') && SCREEN_ONLY.test(to)) return `${zone} may not import the screens' package ${name}`
  return null
}

function pureFault(from: string, to: string): string | null {
  const [, own = ''] = from.split('/')
  const [, other = ''] = to.split('/')
  const allowed = PURE[own] ?? ABOVE
  return own === other || allowed.includes(other) || (!(own in PURE) && !(other in PURE)) ? null : `utils/${own} may not import utils/${other}`
}

/** The folder that the table speaks of; null for tests, scripts and the files at the root. */
function zoneOf(path: string): string | null {
  const [top = '', second = '', ...rest] = path.split('/')
  if (top === 'server' && rest.length > 0) return `server/${second}`
  return top in TOP || top === 'utils' ? top : null
}

describe('who may import whom', () => {
  const files = projectFiles(SOURCES)
  const imports = new Map(files.map(file => [file, importsOf(file)]))

  it('is kept by every file', () => {
    const faults = [...imports].flatMap(([file, found]) => found.flatMap(({ to, line }) => {
      const because = fault(file, to)
      return because ? [`${file}:${line} ${because} (${to})`] : []
    }))
    expect(faults).toEqual([])
  })

  it('looks at the files of every folder, so that a folder moved is not a folder forgotten', () => {
    const zones = new Set(files.map(zoneOf))
    for (const zone of ['utils', 'server/api', 'server/utils', 'server/middleware', 'server/plugins', 'components', 'pages', 'stores', 'composables', 'layouts', 'drizzle']) {
      expect(zones).toContain(zone)
    }
    expect(files.length).toBeGreaterThan(200)
  })

  it('knows every folder of sources', () => {
    const tops = new Set(files.filter(file => file.includes('/')).map(file => file.split('/')[0]))
    expect([...tops].filter(top => !zoneOf(`${top}/any/file.ts`) && top !== 'server')).toEqual(['tests'].filter(top => tops.has(top)))
  })

  it('has no two files that need each other', () => {
    expect(cycles(imports)).toEqual([])
  })
})

describe('the guard itself', () => {
  const planted: [file: string, source: string, because: string][] = [
    ['pages/fleet/index.vue', '<script setup lang="ts">\nimport { useDatabase } from \'~~/server/utils/database/currentDatabase\'\n</script>', 'pages may not import server/utils'],
    ['pages/fleet/index.vue', '<script setup lang="ts">const m = await import(\'../../server/utils/firm\')</script>', 'pages may not import server/utils'],
    ['components/base/BaseButton.vue', '<script setup lang="ts">\nimport { useSessionStore } from \'~/stores/session\'\n</script>', 'components may not import stores'],
    ['components/base/BaseButton.vue', '<script lang="ts">export * from \'../../composables/useApi\'</script>', 'components may not import composables'],
    ['components/base/BaseButton.vue', '<script setup lang="ts">import fs from \'node:fs\'</script>', 'components may not import the server\'s package node:fs'],
    ['server/api/people/index.get.ts', 'import { people } from \'../../../drizzle/schema\'', 'server/api may not import drizzle'],
    ['server/api/people/index.get.ts', 'import { useSessionStore } from \'~~/stores/session\'', 'server/api may not import stores'],
    ['server/utils/firm.ts', 'import { ref } from \'vue\'', 'server/utils may not import the screens\' package vue'],
    ['utils/quantity/mass.ts', 'import { can } from \'../access/permissions\'', 'utils/quantity may not import utils/access'],
    ['utils/access/roles.ts', 'export type { Money } from \'../contract/shipments\'', 'utils/access may not import utils/contract'],
    ['utils/capacity/types.ts', 'type View = import(\'../custody/cylinderView\').CylinderView', 'utils/capacity may not import utils/custody'],
    ['utils/custody/fold.ts', 'import { createHash } from \'node:crypto\'', 'utils may not import the package node:crypto'],
    ['utils/custody/fold.ts', 'const { ref } = require(\'vue\')', 'utils may not import the package vue'],
    ['utils/custody/fold.ts', 'import { useDatabase } from \'../../server/utils/database/currentDatabase\'', 'utils may not import server/utils'],
    ['stores/session.ts', 'import Card from \'@/components/base/BaseCard.vue\'', 'stores may not import components'],
    ['server/utils/firm.ts', 'const name = \'vue\'; await import(name)', 'loads a module whose name is computed'],
    ['pages/index.vue', '<script setup lang="ts">const all = import.meta.glob([\'../server/**\'])</script>', 'loads a module whose name is computed'],
    ['drizzle/schema.ts', 'import { health } from \'../server/utils/health\'', 'drizzle may not import server/utils'],
  ]

  it.each(planted)('finds what is planted in %s: %s', (file, source, because) => {
    expect(importsOf(file, source).map(({ to }) => fault(file, to))).toEqual([because])
  })

  const allowed: [file: string, source: string][] = [
    ['server/api/people/index.get.ts', 'import { listPeople } from \'../../utils/people/people\'\nimport { personParams } from \'../../../utils/contract/people\''],
    ['pages/fleet/index.vue', '<script setup lang="ts">\nimport { useApi } from \'~~/composables/useApi\'\nimport type { User } from \'~~/utils/contract/session\'\n</script>'],
    ['utils/capacity/types.ts', 'import { bubble } from \'../refrigerant/saturation\''],
    ['server/utils/firm.ts', 'import { firm } from \'../../drizzle/schema\'\n// import { ref } from \'vue\''],
  ]

  it.each(allowed)('lets pass what is right in %s', (file, source) => {
    expect(importsOf(file, source).map(({ to }) => fault(file, to)).filter(Boolean)).toEqual([])
  })

  it('names the line, in a component too', () => {
    expect(importsOf('pages/index.vue', '<template>\n  <p />\n</template>\n\n<script setup lang="ts">\nimport a from \'./a\'\n</script>')[0]?.line).toBe(6)
  })

  it('finds files that need each other', () => {
    const sources: Record<string, string> = { 'utils/a/x.ts': 'import \'./y\'', 'utils/a/y.ts': 'import \'../b/z\'', 'utils/b/z.ts': 'import \'../a/x\'', 'utils/b/w.ts': 'import \'./z\'' }
    const imports = (texts: Record<string, string>) => new Map(Object.entries(texts).map(([file, text]) => [file, importsOf(file, text)]))
    expect(cycles(imports({ ...sources, 'utils/b/z.ts': 'import type { X } from \'../a/x\'' }))).toEqual([])
    expect(cycles(imports(sources))).toEqual(['utils/a/x.ts > utils/a/y.ts > utils/b/z.ts > utils/a/x.ts'])
  })
})

/** Chains of files that lead back to where they began at run time, each once. */
function cycles(imports: Map<string, Import[]>): string[] {
  const byName = new Map([...imports.keys()].flatMap(file => [[file, file], [file.replace(/\.(ts|mts)$/, ''), file], [file.replace(/\/index\.ts$/, ''), file]]))
  const done = new Set<string>()
  const found: string[] = []
  const walk = (file: string, trail: string[]): void => {
    const at = trail.indexOf(file)
    if (at >= 0) found.push([...trail.slice(at), file].join(' > '))
    if (at >= 0 || done.has(file)) return
    for (const { to, typeOnly } of imports.get(file) ?? []) {
      const next = byName.get(to)
      if (next && !typeOnly) walk(next, [...trail, file])
    }
    done.add(file)
  }
  for (const file of imports.keys()) walk(file, [])
  return found
}
