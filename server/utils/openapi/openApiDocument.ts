import { z } from 'zod'
import { DETAILS } from '~~/utils/custody/schema'
import type { RouteDescription } from '../http/apiRoute'

/** A route with its place in the API. */
export interface DescribedRoute { path: string, method: string, described: RouteDescription }

type Schema = Record<string, unknown>

const PROBLEM: Schema = {
  type: 'object',
  required: ['type', 'title', 'status', 'detail'],
  properties: {
    type: { type: 'string' },
    title: { type: 'string' },
    status: { type: 'integer' },
    detail: { type: 'string' },
    errors: {
      type: 'array',
      items: { type: 'object', required: ['path', 'message'], properties: { path: { type: 'string' }, message: { type: 'string' } } },
    },
  },
}

/**
 * The API as an OpenAPI 3.1 document, from the schemas that the routes parse by: what each takes and who may call it.
 *
 * The details of every kind of custody event stand under `components.schemas`, for each event is parsed on its own.
 */
export function openApiDocument(routes: readonly DescribedRoute[], version: string, cookie: string) {
  const paths: Record<string, Record<string, unknown>> = {}
  for (const route of [...routes].sort((a, b) => a.path.localeCompare(b.path))) {
    const path = route.path.replace(/:(\w+)/g, '{$1}')
    paths[path] = { ...paths[path], [route.method.toLowerCase()]: operation(route) }
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Collarbook', version },
    paths,
    components: {
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: cookie } },
      schemas: {
        Problem: PROBLEM,
        ...Object.fromEntries(Object.entries(DETAILS).map(([kind, details]) => [`details.${kind}`, schemaOf(details)])),
      },
    },
  }
}

function operation({ path, method, described }: DescribedRoute) {
  const { permission, params, query, body, form, status = 200 } = described
  return {
    'operationId': operationId(method, path),
    'x-permission': permission,
    'security': permission === 'public' ? [] : [{ session: [] }],
    'parameters': [...parameters(params, 'path'), ...parameters(query, 'query')],
    ...(body && { requestBody: { required: true, content: { 'application/json': { schema: schemaOf(body) } } } }),
    ...(form && { requestBody: { required: true, content: { 'multipart/form-data': { schema: schemaOf(form) } } } }),
    'responses': {
      [status]: { description: 'Done.' },
      default: {
        description: 'Not done; the problem says why.',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  }
}

/** `getTestLotsById` for GET /api/test-lots/:id. */
function operationId(method: string, path: string): string {
  const words = path.split('/').slice(2).flatMap(part => part.startsWith(':') ? ['by', part.slice(1)] : part.split(/[^a-z0-9]+/i))
  return [method.toLowerCase(), ...words.map(word => word.charAt(0).toUpperCase() + word.slice(1))].join('')
}

function parameters(schema: z.ZodType | undefined, place: 'path' | 'query') {
  if (!schema) return []
  const { properties = {}, required = [] } = schemaOf(schema) as { properties?: Record<string, Schema>, required?: string[] }
  return Object.entries(properties).map(([name, property]) => ({
    name, in: place, required: place === 'path' || required.includes(name), schema: property,
  }))
}

/** What a sender writes, before anything is trimmed, turned or filled in. */
function schemaOf(schema: z.ZodType): Schema {
  const { $schema: _, ...own } = z.toJSONSchema(schema, { target: 'draft-2020-12', io: 'input', unrepresentable: 'any' })
  return own
}
