import { describe, expect, it } from 'vitest'
import { isJson, parseJson } from '../../../server/utils/http/jsonBody'
import type { Problem } from '../../../server/utils/http/problem'

function status(text: string): number {
  try {
    parseJson(text)
    return 200
  }
  catch (error) {
    return (error as Problem).details.status
  }
}

describe('a body of JSON', () => {
  it.each(['{', '{"a":1,}', 'undefined', '{a:1}', '[1', '\u{FEFF}{}'])('is malformed: %s', (text) => {
    expect(status(text)).toBe(400)
  })

  it('may be anything well-formed; its schema judges', () => {
    for (const text of ['null', '[]', '{"a":{"b":[1]}}', '"text"']) expect(status(text)).toBe(200)
  })

  it('must not reach the prototype, however it is written', () => {
    expect(status('{"__proto__":{"admin":true}}')).toBe(400)
    expect(status('{"details":{"__proto__":null}}')).toBe(400)
    expect(status('{"\\u005f_proto__":{"admin":true}}')).toBe(400)
    expect(status('[{"_\\u005Fproto__":1}]')).toBe(400)
  })

  it('may speak of the prototype in a text', () => {
    expect(parseJson('{"note":"__proto__"}')).toEqual({ note: '__proto__' })
  })

  it('is known by its type', () => {
    for (const type of ['application/json', 'Application/JSON; charset=utf-8', 'application/json;charset="UTF-8"']) expect(isJson(type)).toBe(true)
    for (const type of [undefined, '', 'application/json-seq', 'text/json', 'application/json; charset=utf-16']) expect(isJson(type)).toBe(false)
  })
})
