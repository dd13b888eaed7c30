import { readFileSync } from 'node:fs'
import ts from 'typescript'
import { describe, expect, it } from 'vitest'
import { PERMISSIONS } from '../../utils/access/permissions'
import { projectFiles } from '../helpers/sources'

const KNOWN = new Set<string>(['public', 'signed-in', ...Object.values(PERMISSIONS).flat()])

/** The routes that anybody may call. A new one is written down here on purpose, or not at all. */
const OPEN = [
  'server/api/[...].ts',
  'server/api/dock/[token]/index.get.ts',
  'server/api/dock/[token]/photos/[id].get.ts',
  'server/api/dock/[token]/photos/index.post.ts',
  'server/api/dock/[token]/shipments/[id]/entries.post.ts',
  'server/api/firm/card.get.ts',
  'server/api/health.get.ts',
  'server/api/invitations/[token]/index.get.ts',
  'server/api/invitations/[token]/index.post.ts',
  'server/api/session/index.delete.ts',
  'server/api/session/index.post.ts',
  'server/api/setup.get.ts',
  'server/api/setup.post.ts',
]

/** The permission that a route states, or what is wrong with it. */
function statedPermission(path: string, text: string): { permission?: string, fault?: string } {
  const source = ts.createSourceFile(path, text, ts.ScriptTarget.Latest, true)
  if (!importsTheWrapper(source)) return { fault: 'does not import apiRoute from http/apiRoute' }
  const exported = source.statements.find(ts.isExportAssignment)?.expression
  if (!exported || !ts.isCallExpression(exported) || exported.expression.getText() !== 'apiRoute') return { fault: 'does not export an apiRoute' }
  const [options] = exported.arguments
  if (!options || !ts.isObjectLiteralExpression(options)) return { fault: 'does not write its options down' }
  const stated = options.properties.find(property => property.name?.getText() === 'permission')
  const value = stated && ts.isPropertyAssignment(stated) ? stated.initializer : undefined
  if (!value || !ts.isStringLiteral(value)) return { fault: 'does not state its permission' }
  return KNOWN.has(value.text) ? { permission: value.text } : { fault: `states the unknown permission ${value.text}` }
}

function importsTheWrapper(source: ts.SourceFile): boolean {
  return source.statements.some(statement => ts.isImportDeclaration(statement)
    && ts.isStringLiteral(statement.moduleSpecifier) && /(^|\/)utils\/http\/apiRoute$/.test(statement.moduleSpecifier.text)
    && statement.importClause?.namedBindings?.getText() === '{ apiRoute }')
}

describe('every route of the API', () => {
  const routes = [...projectFiles(/\.ts$/, 'server/api'), ...projectFiles(/\.ts$/, 'server').filter(file => file.startsWith('server/routes/'))]

  it('states a known permission', () => {
    expect(routes.length).toBeGreaterThan(20)
    const faults = routes.flatMap((route) => {
      const { fault } = statedPermission(route, readFileSync(route, 'utf8'))
      return fault ? [`${route} ${fault}`] : []
    })
    expect(faults).toEqual([])
  })

  it('is open to anybody only where it is listed here', () => {
    const open = routes.filter(route => statedPermission(route, readFileSync(route, 'utf8')).permission === 'public')
    expect(open.sort()).toEqual([...OPEN].sort())
  })

  it('has its method in its name, but for the one that answers what is unknown', () => {
    expect(routes.filter(route => !/\.(get|post|put|patch|delete)\.ts$/.test(route))).toEqual(['server/api/[...].ts'])
  })

  it('changes nothing by a GET that a permission to write stands on', () => {
    const writing = /:(manage|prepare|dispatch|receive|post|correct-any|register)$/
    const faults = routes.filter(route => route.endsWith('.get.ts') && writing.test(statedPermission(route, readFileSync(route, 'utf8')).permission ?? ''))
    expect(faults).toEqual([])
  })
})

describe('the guard itself', () => {
  const WRAPPER = 'import { apiRoute } from \'../utils/http/apiRoute\'\n'

  it.each([
    ['export default defineEventHandler(() => 1)', 'does not import apiRoute from http/apiRoute'],
    ['import { apiRoute } from \'./mine\'\nexport default apiRoute({ permission: \'public\' }, () => 1)', 'does not import apiRoute from http/apiRoute'],
    [`${WRAPPER}export default defineEventHandler(() => apiRoute({ permission: 'public' }, () => 1))`, 'does not export an apiRoute'],
    [`${WRAPPER}apiRoute({ permission: 'public' }, () => 1)`, 'does not export an apiRoute'],
    [`${WRAPPER}export default apiRoute(options, () => 1)`, 'does not write its options down'],
    [`${WRAPPER}export default apiRoute({}, () => 1)`, 'does not state its permission'],
    [`${WRAPPER}export default apiRoute({ ...options }, () => 1)`, 'does not state its permission'],
    [`${WRAPPER}export default apiRoute({ permission: who() }, () => 1)`, 'does not state its permission'],
    [`${WRAPPER}// permission: 'public'\nexport default apiRoute({ permission: 'fleet:write' }, () => 1)`, 'states the unknown permission fleet:write'],
  ])('finds a route that is not guarded: %s', (source, fault) => {
    expect(statedPermission('server/api/planted.get.ts', source)).toEqual({ fault })
  })

  it('lets a guarded one pass', () => {
    expect(statedPermission('server/api/right.get.ts', `${WRAPPER}export default apiRoute({ permission: 'fleet:read' }, () => 1)`)).toEqual({ permission: 'fleet:read' })
  })
})
