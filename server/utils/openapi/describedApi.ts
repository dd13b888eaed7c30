import routes from '#api-routes'
import { version } from '~~/package.json'
import { useEnvironment } from '../environment'
import { cookieName } from '../session/sessionCookie'
import { openApiDocument, type DescribedRoute } from './openApiDocument'

let document: Promise<ReturnType<typeof openApiDocument>> | null = null

/** The API of this very server; described once a process. */
export function describedApi() {
  document ??= describedRoutes().then(described => openApiDocument(described, version, cookieName(useEnvironment().secure)))
  return document
}

async function describedRoutes(): Promise<DescribedRoute[]> {
  const loaded = await Promise.all(routes.map(async ({ path, method, load }) => ({ path, method, described: (await load()).default.described })))
  return loaded.flatMap(({ path, method, described }) => described ? [{ path, method, described }] : [])
}
