import { describe, expect, it } from 'vitest'
import { safeNext } from '../../../composables/useNext'

describe('where a person goes on to after signing in', () => {
  it('is the page that was asked for', () => {
    expect(safeNext('/c/7k3m9q2tx?refrigerant=R-410A')).toBe('/c/7k3m9q2tx?refrigerant=R-410A')
  })

  it.each(['//evil.example', '/\\evil.example', 'https://evil.example', '/a\\..\\\\evil.example', '/\t/evil.example', 'javascript:alert(1)', undefined, ['/a'], '/sign-in?next=/sign-in'])(
    'is never another site, nor the sign-in page again: %j', (next) => {
      expect(safeNext(next)).toBe('/')
    })
})
