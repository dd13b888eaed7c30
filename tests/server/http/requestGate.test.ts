import { describe, expect, it } from 'vitest'
import { refusalAtGate } from '../../../server/utils/http/requestGate'

const OWN = { 'host': 'cylinders.example', 'sec-fetch-site': 'same-origin' }
const JSON_BODY = { 'content-type': 'application/json', 'content-length': '20' }

function status(method: string, headers: Record<string, string | string[]>, path = '/api/events'): number | null {
  return refusalAtGate({ method, path, headers })?.details.status ?? null
}

describe('the gate', () => {
  it('lets everything be read from anywhere', () => {
    expect(status('GET', { 'host': 'cylinders.example', 'sec-fetch-site': 'cross-site' })).toBeNull()
    expect(status('HEAD', { host: 'cylinders.example' })).toBeNull()
  })

  it('lets our own pages change things', () => {
    expect(status('POST', { ...OWN, ...JSON_BODY })).toBeNull()
    expect(status('DELETE', OWN)).toBeNull()
  })

  it.each(['cross-site', 'same-site', 'none', ''])('turns away what is sent from %s, whatever the Origin says', (site) => {
    expect(status('POST', { ...OWN, ...JSON_BODY, 'sec-fetch-site': site, 'origin': 'https://cylinders.example' })).toBe(403)
  })

  it('turns away what does not say where it comes from', () => {
    expect(status('POST', { host: 'cylinders.example', ...JSON_BODY })).toBe(403)
    expect(status('DELETE', { host: 'cylinders.example' })).toBe(403)
  })

  it('takes an Origin of our own host where the browser says no more', () => {
    expect(status('POST', { host: 'cylinders.example', origin: 'https://cylinders.example', ...JSON_BODY })).toBeNull()
    expect(status('POST', { host: 'localhost:3000', origin: 'http://localhost:3000', ...JSON_BODY })).toBeNull()
  })

  it.each(['https://evil.example', 'https://cylinders.example.evil.example', 'null', 'https://cylinders.example:8443', ''])('turns away the Origin %s', (origin) => {
    expect(status('POST', { host: 'cylinders.example', origin, ...JSON_BODY })).toBe(403)
  })

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'application/json; charset=latin1', 'application/jsonp', 'text/plain; application/json'])('turns away a body of %s', (type) => {
    expect(status('POST', { ...OWN, ...JSON_BODY, 'content-type': type })).toBe(415)
  })

  it('turns away a body without a type, also one of unknown length', () => {
    expect(status('POST', { ...OWN, 'content-length': '2' })).toBe(415)
    expect(status('POST', { ...OWN, 'transfer-encoding': 'chunked' })).toBe(415)
  })

  it('takes a body of 512 KiB and turns away one byte more', () => {
    expect(status('POST', { ...OWN, ...JSON_BODY, 'content-length': '524288' })).toBeNull()
    expect(status('POST', { ...OWN, ...JSON_BODY, 'content-length': '524289' })).toBe(413)
  })

  it('takes a form where a photo is sent, of 8 MiB and what stands beside it, and nowhere else', () => {
    const form = { ...OWN, 'content-type': 'multipart/form-data; boundary=x', 'content-length': '8454144' }
    expect(status('POST', form, '/api/uploads')).toBeNull()
    expect(status('POST', { ...form, 'content-length': '8454145' }, '/api/uploads')).toBe(413)
    expect(status('POST', { ...OWN, ...JSON_BODY }, '/api/uploads')).toBe(415)
    expect(status('POST', { ...form, 'sec-fetch-site': 'cross-site' }, '/api/uploads')).toBe(403)
    expect(status('POST', { ...form, 'content-length': '20' }, '/api/uploadsx')).toBe(415)
  })

  it('takes a form where a statement is sent, each of its own size', () => {
    const form = { ...OWN, 'content-type': 'multipart/form-data; boundary=x' }
    const at = (path: string, length: number) => status('POST', { ...form, 'content-length': String(length) }, `/api/shipments/1/${path}`)
    // 10 MiB, and 512 KiB, each with 64 KiB for what stands beside it.
    expect([at('files', 10_551_296), at('files', 10_551_297)]).toEqual([null, 413])
    expect([at('settlement/csv-preview', 589_824), at('settlement/csv-preview', 589_825)]).toEqual([null, 413])
    expect([at('settlement/csv-take-over', 589_824), at('settlement/lines', 20), at('files/2/lines', 20)]).toEqual([null, 415, 415])
  })

  it('lets no page be posted to', () => {
    expect(status('POST', { ...OWN, ...JSON_BODY }, '/sign-in')).toBe(404)
  })

  it('hides the session package\'s own routes', () => {
    for (const path of ['/api/_auth/session', '/api/_auth', '/api/_auth/session?x=1']) expect(status('GET', OWN, path)).toBe(404)
    expect(status('GET', OWN, '/api/_author')).toBeNull()
  })
})
