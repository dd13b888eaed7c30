import { defineEventHandler, getRouterParams, setResponseStatus, type EventHandler, type EventHandlerRequest, type H3Event } from 'h3'
import type { z } from 'zod'
import type { Access } from '../../../utils/access/roles'
import type { Permission } from '../../../utils/access/permissions'
import type { User } from '../../../utils/contract/session'
import { accessOf, currentUser } from '../session/currentUser'
import { asProblem } from './asProblem'
import { readFormBody } from './formBody'
import { insistOn } from './insistOn'
import { readJsonBody } from './jsonBody'
import { loggedPath } from './loggedPath'
import { problem, sendProblem } from './problem'
import { queryOf, validate } from './validate'

/** Who may call a route: anybody, anybody signed in, or who holds a permission. */
export type RoutePermission = Permission | 'public' | 'signed-in'

/** Who may call a route, what it takes, and the status of its answer. */
export interface RouteOptions<Who extends RoutePermission, P, Q, B, F = undefined> {
  permission: Who
  /** Strict schemas. A route without one takes no parameters of that sort: a query is then refused. */
  params?: P
  query?: Q
  body?: B
  /** Of a body that comes as multipart/form-data, with a file in it, in place of JSON. */
  form?: F
  /** Of the answer; 200 unless given. */
  status?: number
}

/** What a route says of itself: who may call it and what it takes. */
export type RouteDescription = RouteOptions<RoutePermission, z.ZodType | undefined, z.ZodType | undefined, z.ZodType | undefined, z.ZodType | undefined>

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined

/** What a route's handler is given. A public route knows nobody: it must work without the database. */
export interface RouteContext<Who extends RoutePermission, P, Q, B, F = undefined> {
  event: H3Event
  access: Who extends 'public' ? null : Access
  person: Who extends 'public' ? null : User
  params: Parsed<P>
  query: Parsed<Q>
  body: Parsed<B>
  form: Parsed<F>
}

/**
 * A route of the API: signs in (401), checks the permission (403), parses path, query and body (400, 413, 415), in that
 * order, then calls the handler. Whatever is thrown becomes problem details.
 *
 * Example: `export default apiRoute({ permission: 'fleet:read', params }, ({ params }) => cylinderView(params.ref))`
 */
export function apiRoute<
  Who extends RoutePermission, R,
  P extends z.ZodType | undefined = undefined,
  Q extends z.ZodType | undefined = undefined,
  B extends z.ZodType | undefined = undefined,
  F extends z.ZodType | undefined = undefined,
>(
  options: RouteOptions<Who, P, Q, B, F>,
  handler: (context: RouteContext<Who, P, Q, B, F>) => R | Promise<R>,
): EventHandler<EventHandlerRequest, Promise<R>> & { described: RouteDescription } {
  const handle = defineEventHandler(async (event): Promise<R> => {
    try {
      const person = options.permission === 'public' ? null : await admit(event, options.permission)
      const context = {
        event,
        person,
        access: person && accessOf(person),
        params: options.params && validate(options.params, pathOf(event), 'path'),
        query: readQuery(event, options.query),
        body: options.body && validate(options.body, await readJsonBody(event), 'body'),
        form: options.form && validate(options.form, await readFormBody(event), 'body'),
      } as RouteContext<Who, P, Q, B, F>
      const answer = await handler(context)
      if (options.status) setResponseStatus(event, options.status)
      return answer
    }
    catch (error) {
      const told = asProblem(error)
      if (told.details.status >= 500) console.error(`${event.method} ${loggedPath(event.path)} failed:`, error)
      await sendProblem(event, told)
      return undefined as R
    }
  })
  return Object.assign(handle, { described: options })
}

async function admit(event: H3Event, permission: Permission | 'signed-in'): Promise<User> {
  const person = await currentUser(event)
  if (!person) throw problem(401, 'Not signed in', 'Sign in first.', undefined, { type: 'not-signed-in' })
  if (permission !== 'signed-in') await insistOn(person, permission)
  return person
}

function pathOf(event: H3Event): Record<string, string> {
  try {
    return getRouterParams(event, { decode: true })
  }
  catch {
    throw problem(400, 'Malformed', 'The path does not fit.')
  }
}

function readQuery(event: H3Event, schema: z.ZodType | undefined): unknown {
  const query = queryOf(event.path)
  if (schema) return validate(schema, query, 'query')
  const unknown = Object.keys(query)
  if (unknown.length > 0) {
    throw problem(400, 'Malformed', 'The query does not fit.', unknown.map(path => ({ path, message: 'is not known here' })))
  }
  return undefined
}
