import { describe, expect, it } from 'vitest'
import { forPrint, spelled, unprintable } from '../../../../utils/label/printable'

describe('what labels and papers can be printed with', () => {
  it.each(['Łódź Chłodnictwo', 'Škoda Řehoř', 'Șerban Țepeș', 'Ağrı Soğutma', 'Ψύξη Αθήνα', 'Київ Холод Ґ', 'Құрылыс Өскемен', 'Điện Lạnh Huế', 'café “No. 1” – 5 °F'])('is every letter of “%s”', (name) => {
    expect(unprintable(name)).toEqual([])
  })

  it('is no letter of Chinese, no emoji and no unheard-of sign, each named once', () => {
    expect(unprintable('株式会社 Tarn 株')).toEqual(['株', '式', '会', '社'])
    expect(unprintable('Cool ❄️ Air 🧊')).toEqual(['❄', '🧊'])
  })
})

describe('a text that goes to print', () => {
  it('has a letter and its mark as one letter', () => {
    expect(forPrint('Zoe\u0308')).toBe('Zoë')
  })

  it('has one kind of space, and nothing that nobody sees', () => {
    expect(forPrint('68.0\u00A0lb\u2009net\u200B')).toBe('68.0 lb net')
  })

  it('has a character that cannot be printed by its number', () => {
    expect(spelled('株')).toBe('[U+682A]')
    expect(spelled('🧊')).toBe('[U+1F9CA]')
  })
})
