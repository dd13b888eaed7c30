import { describe, expect, it } from 'vitest'
import { usualSubject } from '../../../../utils/picture/usualSubject'

describe('what a photo mostly shows', () => {
  it('is the scale at a weighing, the stamp at a registration, the damage at an inspection', () => {
    expect(['weighed', 'registered', 'inspected', 'moved'].map(kind => usualSubject(kind as 'weighed'))).toEqual(['scale', 'stamp', 'damage', 'other'])
  })
})
