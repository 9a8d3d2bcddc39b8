import type { Config } from 'tailwindcss'

const token = (name: string) => `var(--${name})`

/**
 * Colours are CSS variables, so that light and dark are one set of class names; their values are in src/app/styles.css.
 * Sizes stand on a 1.2 scale and nothing is smaller than 16 px.
 */
export default {
  content: [],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: token('paper'),
      card: token('card'),
      ink: token('ink'),
      pencil: token('pencil'),
      /** Hairlines between things. */
      rule: token('rule'),
      /** Borders that must be seen to use a control (3:1). */
      edge: token('edge'),
      /** Load, and what a joint cannot take. */
      oxide: token('oxide'),
      /** Target drive. */
      lichen: token('lichen'),
      /** Caution. */
      brass: token('brass'),
      /** Links, buttons, focus. */
      slate: token('slate'),
      /** Tracks, table heads, the chosen place in the rail. */
      wash: token('wash'),
      /** Over the page while a dialog is open. */
      shade: 'rgb(12 14 16 / 0.6)',
      /** An opened row: half way from card to wash. */
      opened: 'color-mix(in srgb, var(--wash) 50%, var(--card))',
      'brass-wash': token('brass-wash'),
      'oxide-wash': token('oxide-wash'),
      /** Flesh and outline of the figure and the body chart. */
      body: token('body'),
      'body-line': token('body-line'),
    },
    fontFamily: {
      sans: ['"Source Sans 3"', 'system-ui', 'sans-serif'],
    },
    fontSize: {
      base: ['1rem', { lineHeight: '1.5' }],
      lg: ['1.2rem', { lineHeight: '1.3' }],
      xl: ['1.44rem', { lineHeight: '1.25' }],
      '2xl': ['1.728rem', { lineHeight: '1.15' }],
      '3xl': ['2.074rem', { lineHeight: '1.15' }],
    },
    extend: {
      maxWidth: { prose: '68ch', page: '80rem' },
      minHeight: { target: '2.75rem' },
      minWidth: { target: '2.75rem' },
    },
  },
} satisfies Config
