import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { callerAddress } from '../../../server/utils/http/callerAddress'
import { asProblem } from '../../../server/utils/http/asProblem'
import { problem, type Problem } from '../../../server/utils/http/problem'
import { queryOf, validate } from '../../../server/utils/http/validate'

function detailsOf(work: () => unknown) {
  try {
    work()
  }
  catch (error) {
    return (error as Problem).details
  }
  throw new Error('nothing was refused')
}

const schema = z.strictObject({ lines: z.array(z.strictObject({ gross: z.number() })) })

describe('what does not fit a schema', () => {
  it('is named by its path', () => {
    const details = detailsOf(() => validate(schema, { lines: [{ gross: 1 }, { gross: 'heavy' }] }, 'body'))
    expect(details).toMatchObject({ status: 400, errors: [{ path: 'lines.1.gross' }] })
  })

  it('is named where it is not known', () => {
    const details = detailsOf(() => validate(schema, { lines: [], roles: ['admin'] }, 'body'))
    expect(details.errors).toEqual([{ path: 'roles', message: 'is not known here' }])
  })

  it.each([null, undefined, [], 'text', 7])('is refused as malformed, never as a failure of ours: %s', (value) => {
    expect(detailsOf(() => validate(schema, value, 'body')).status).toBe(400)
  })
})

describe('a query', () => {
  it('holds each key once', () => {
    expect(queryOf('/api/cylinders?q=R-410A&place=a%20b')).toEqual({ q: 'R-410A', place: 'a b' })
    expect(queryOf('/api/cylinders')).toEqual({})
    expect(detailsOf(() => queryOf('/api/cylinders?q=1&q=2')).status).toBe(400)
    expect(detailsOf(() => queryOf('/api/cylinders?__proto__=1&__proto__=2')).status).toBe(400)
  })

  it('gives the prototype as a key like any other, which no schema knows', () => {
    const query = queryOf('/api/cylinders?__proto__=x')
    expect(Object.getPrototypeOf(query)).toBe(Object.prototype)
    expect(detailsOf(() => validate(z.strictObject({ q: z.string().optional() }), query, 'query')).status).toBe(400)
  })
})

describe('a failure below a route', () => {
  it('tells nothing of itself', () => {
    const told = asProblem(new Error('select password_hash from people at /srv/app.mjs:1'))
    expect(told.details.status).toBe(500)
    expect(JSON.stringify(told.details)).not.toMatch(/select|srv|password/)
  })

  it('is 503 where the disk is full or cannot be written, also when wrapped', () => {
    const full = Object.assign(new Error('SQLITE_FULL: database or disk is full'), { code: 'SQLITE_FULL' })
    expect(asProblem(full).details).toMatchObject({ status: 503, type: 'database-unavailable', detail: expect.stringContaining('disk') })
    const readOnly = Object.assign(new Error('attempt to write a readonly database'), { code: 'SQLITE_READONLY' })
    expect(asProblem(new Error('Failed query', { cause: readOnly })).details.status).toBe(503)
  })

  it('is itself where it was meant for the caller', () => {
    const meant = problem(409, 'Changed', 'It was changed meanwhile.')
    expect(asProblem(meant)).toBe(meant)
  })
})

describe('the address of a caller', () => {
  it('is the socket\'s, whatever a caller forwards', () => {
    expect(callerAddress('203.0.113.9', '198.51.100.1', 0)).toBe('203.0.113.9')
  })

  it('is what our own proxy saw, not what was written before it', () => {
    expect(callerAddress('10.0.0.1', '198.51.100.66, 203.0.113.9', 1)).toBe('203.0.113.9')
    expect(callerAddress('10.0.0.1', '198.51.100.66, 203.0.113.9, 10.0.0.2', 2)).toBe('203.0.113.9')
  })

  it('is the furthest known where the proxies said less than they should', () => {
    expect(callerAddress('10.0.0.1', undefined, 1)).toBe('10.0.0.1')
    expect(callerAddress(undefined, undefined, 0)).toBe('unknown')
  })
})
