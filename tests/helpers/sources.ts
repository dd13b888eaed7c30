import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, normalize } from 'node:path'
import ts from 'typescript'

const NOT_OURS = new Set(['node_modules', '.nuxt', '.output', '.git', '.data', 'data', 'coverage', 'test-results'])

/** Every file of the project whose name fits, by its path from the root. */
export function projectFiles(fits: RegExp, folder = ''): string[] {
  return readdirSync(folder || '.', { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name)
    if (entry.isDirectory()) return NOT_OURS.has(entry.name) ? [] : projectFiles(fits, path)
    return fits.test(entry.name) ? [path] : []
  })
}

/** What a file imports: a path from the root (no ending) for ours, 'package:name' for others, '(computed)' where it cannot be read. */
export interface Import { to: string, line: number, /** Leaves nothing at run time. */ typeOnly: boolean, /** Fetched only once it is asked for. */ isLazy: boolean }

/** Static and dynamic imports of a .ts or .vue source, of types too. */
export function importsOf(path: string, text = readFileSync(path, 'utf8')): Import[] {
  const script = path.endsWith('.vue') ? scriptsOf(text) : text
  const source = ts.createSourceFile(`${path}.ts`, script, ts.ScriptTarget.Latest, true)
  const found: Import[] = []
  const add = (at: ts.Node, specifier: ts.Node | undefined, { typeOnly = false, isLazy = false } = {}) => found.push({
    typeOnly,
    isLazy,
    to: specifier && ts.isStringLiteralLike(specifier) ? targetOf(path, specifier.text) : '(computed)',
    line: source.getLineAndCharacterOfPosition(at.getStart()).line + 1,
  })
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node)) add(node, node.moduleSpecifier, { typeOnly: isErased(node.importClause) })
    else if (ts.isExportDeclaration(node) && node.moduleSpecifier) add(node, node.moduleSpecifier, { typeOnly: node.isTypeOnly })
    else if (ts.isImportTypeNode(node)) add(node, ts.isLiteralTypeNode(node.argument) ? node.argument.literal : undefined, { typeOnly: true })
    else if (ts.isCallExpression(node) && isLoading(node.expression)) add(node, node.arguments[0], { isLazy: node.expression.kind === ts.SyntaxKind.ImportKeyword })
    ts.forEachChild(node, visit)
  }
  visit(source)
  return found
}

/** `import type`, or nothing but `type` names. */
function isErased(clause: ts.ImportClause | undefined): boolean {
  if (!clause) return false
  const names = clause.namedBindings
  const onlyTypes = names !== undefined && ts.isNamedImports(names) && names.elements.length > 0 && names.elements.every(name => name.isTypeOnly)
  return clause.isTypeOnly || (!clause.name && onlyTypes)
}

/** import(), require() and import.meta.glob(). */
function isLoading(called: ts.Expression): boolean {
  return called.kind === ts.SyntaxKind.ImportKeyword
    || (ts.isIdentifier(called) && called.text === 'require')
    || (ts.isPropertyAccessExpression(called) && called.name.text === 'glob' && ts.isMetaProperty(called.expression))
}

function targetOf(path: string, specifier: string): string {
  if (specifier.startsWith('.')) return normalize(join(dirname(path), specifier))
  const ours = /^(?:~~?|@@?)\/(.*)$/.exec(specifier)
  return ours ? normalize(ours[1] ?? '') : `package:${specifier}`
}

/** The scripts of a component, with the lines before them left empty so that line numbers hold. */
function scriptsOf(text: string): string {
  return [...text.matchAll(/<script\b[^>]*>([\s\S]*?)<\/script>/g)].reduce((script, match) => {
    const body = match[1] ?? ''
    const begin = text.slice(0, match.index + match[0].indexOf(body)).split('\n').length
    return script + '\n'.repeat(Math.max(0, begin - script.split('\n').length)) + body
  }, '')
}
