import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { z } from 'zod'
import { openApiDocument } from '../../server/utils/openapi/openApiDocument'
import { EVENT_KINDS } from '../../utils/custody/kinds'
import { TestClient } from '../helpers/client'
import { setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'
import { projectFiles } from '../helpers/sources'

interface Document {
  openapi: string
  paths: Record<string, Record<string, { operationId: string, parameters: { name: string, in: string, required: boolean }[], requestBody?: object, responses: object }>>
  components: { schemas: Record<string, { properties?: Record<string, object> }>, securitySchemes: { session: { name: string } } }
}

describe('a route in the description of the API', () => {
  const described = openApiDocument([{
    path: '/api/racks/:id',
    method: 'PATCH',
    described: {
      permission: 'places:manage',
      params: z.strictObject({ id: z.uuid() }),
      query: z.strictObject({ limit: z.coerce.number().int().max(200).default(50), state: z.enum(['open', 'closed']) }),
      body: z.strictObject({ name: z.string().trim().min(1).transform(name => name.length) }),
      status: 201,
    },
  }], '1.2.3', 'collarbook')

  it('says what it takes as its sender writes it, and who may call it', () => {
    expect(described.paths['/api/racks/{id}']!['patch']).toMatchObject({
      'operationId': 'patchRacksById',
      'x-permission': 'places:manage',
      'security': [{ session: [] }],
      'parameters': [
        { name: 'id', in: 'path', required: true, schema: { type: 'string', format: 'uuid' } },
        { name: 'limit', in: 'query', required: false, schema: { type: 'integer', maximum: 200, default: 50 } },
        { name: 'state', in: 'query', required: true, schema: { enum: ['open', 'closed'] } },
      ],
      'requestBody': { content: { 'application/json': { schema: { type: 'object', required: ['name'], additionalProperties: false, properties: { name: { type: 'string' } } } } } },
      'responses': { 201: {}, default: {} },
    })
  })

  it('asks for no session where anybody may call it', () => {
    const open = openApiDocument([{ path: '/api/health', method: 'GET', described: { permission: 'public' } }], '1.2.3', 'collarbook')
    expect(open.paths['/api/health']!['get']).toMatchObject({ 'x-permission': 'public', 'security': [], 'parameters': [] })
  })
})

describe('the description that the server gives of itself', () => {
  let server: TestServer
  let admin: Member
  beforeAll(async () => {
    server = await startServer()
    admin = await setUpFirm(server)
  })
  afterAll(() => server.stop())

  it('has every route, each under a name of its own', async () => {
    const { status, body } = await admin.client.get<Document>('/api/openapi.json')
    expect(status).toBe(200)
    const described = Object.entries(body.paths).flatMap(([path, methods]) => Object.keys(methods).map(method => `${method} ${path}`))
    const files = projectFiles(/\.(get|post|put|patch|delete)\.ts$/, 'server/api').map((file) => {
      const [, route, method] = /^server(\/api\/.*?)(?:\/index)?\.(\w+)\.ts$/.exec(file)!
      return `${method} ${route!.replace(/\[(\w+)\]/g, '{$1}')}`
    })
    expect(described.sort()).toEqual(files.sort())
    const names = Object.values(body.paths).flatMap(methods => Object.values(methods).map(one => one.operationId))
    expect(new Set(names).size).toBe(names.length)
  })

  it('says what a fill and a dispatch hold', async () => {
    const { body } = await admin.client.get<Document>('/api/openapi.json')
    expect(EVENT_KINDS.filter(kind => !body.components.schemas[`details.${kind}`])).toEqual([])
    expect(Object.keys(body.components.schemas['details.filled']!.properties!)).toEqual(expect.arrayContaining(['refrigerant', 'grossBefore', 'grossAfter', 'looked']))
    expect(body.paths['/api/shipments/{id}/dispatch']!['post']!.requestBody).toMatchObject({
      content: { 'application/json': { schema: { required: ['occurredAt', 'lines'] } } },
    })
    expect(body.components.securitySchemes.session.name).toBe([...admin.client.cookies.keys()][0])
  })

  it('is for people who are signed in', async () => {
    expect((await new TestClient(server.baseUrl).get('/api/openapi.json')).status).toBe(401)
  })
})
