import type { Config } from 'tailwindcss'
import plugin from 'tailwindcss/plugin'

/** One status is five colours: the fill, what stands on it, text in it, its soft ground and its edge. */
function statusColours(kind: 'ok' | 'att' | 'stop' | 'unk') {
  return {
    [kind]: `var(--${kind})`,
    [`on${kind}`]: `var(--on${kind})`,
    [`${kind}T`]: `var(--${kind}-text)`,
    [`${kind}S`]: `var(--${kind}-soft)`,
    [`${kind}B`]: `var(--${kind}-edge)`,
  }
}

// The values live in assets/css/tailwind.css, once for each of light, dark and sunlight.
export default {
  content: [],
  darkMode: 'class',
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      canvas: 'var(--canvas)',
      surface: 'var(--surface)',
      sunk: 'var(--sunk)',
      picked: 'var(--picked)',
      ink: 'var(--ink)',
      muted: 'var(--muted)',
      line: 'var(--line)',
      edge: 'var(--edge)',
      brand: 'var(--brand)',
      onbrand: 'var(--onbrand)',
      band: 'var(--band)',
      onband: 'var(--onband)',
      mark: 'var(--mark)',
      primary: 'var(--primary)',
      onprimary: 'var(--onprimary)',
      link: 'var(--link)',
      focus: 'var(--focus)',
      plate: 'var(--plate)',
      onplate: 'var(--onplate)',
      ...statusColours('ok'),
      ...statusColours('att'),
      ...statusColours('stop'),
      ...statusColours('unk'),
    },
    fontFamily: {
      sans: ['Barlow', 'system-ui', 'sans-serif'],
      mono: [['"Roboto Mono"', 'ui-monospace', 'monospace'], { fontFeatureSettings: '"zero", "tnum"' }],
    },
    fontSize: {
      sm: ['var(--size-sm)', '1.4'],
      base: ['var(--size-base)', '1.4'],
      lg: ['var(--size-lg)', '1.25'],
      xl: ['var(--size-xl)', '1.1'],
      hero: ['var(--size-hero)', '0.95'],
    },
    fontWeight: { normal: '400', medium: '500', semibold: '600', bold: '700' },
    extend: {
      borderRadius: {
        cell: '6px 6px 2px 2px',
        button: '14px 14px 4px 4px',
        card: '22px 22px 4px 4px',
        primary: '24px 24px 6px 6px',
        plate: '30px 30px 6px 6px',
      },
      borderWidth: { DEFAULT: 'var(--hair)', thin: 'max(1.5px, var(--hair))', foot: '4px' },
      borderColor: { DEFAULT: 'var(--line)' },
      // Heights of what a hand presses: a row of the field, its main button, a row and a button of the desk.
      spacing: { row: 'var(--key-row)', primary: 'var(--key-primary)', deskrow: '38px', desk: 'var(--press)', chip: 'var(--press-chip)' },
      maxWidth: { phone: '35rem', desk: '90rem', words: '42rem' },
      transitionDuration: { DEFAULT: '120ms' },
    },
  },
  plugins: [
    plugin(({ addVariant }) => addVariant('sun', ':is(.sun &)')),
  ],
} satisfies Config
