/** Tokens live in src/styles/tokens.css as custom properties, so that light and dark share one set of names. */
const px = (value) => `${value / 16}rem`;

export default {
  content: ['./src/**/*.{astro,ts,tsx}'],
  theme: {
    // The margin stands beside the plate from lg; below, under it.
    screens: { md: '768px', lg: '1100px', xl: '1440px' },
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ground: 'var(--ground)',
      sheet: 'var(--sheet)',
      ink: 'var(--ink)',
      quiet: 'var(--quiet)',
      edge: 'var(--edge)',
      hair: 'var(--hair)',
      action: 'var(--action)',
      stop: 'var(--stop)',
      warning: 'var(--warning)',
      good: 'var(--good)',
      well: 'var(--well)',
      'on-well': 'var(--on-well)',
    },
    fontFamily: { sans: ['Manrope', 'sans-serif'] },
    fontWeight: { normal: '400', semibold: '600', bold: '700' },
    fontSize: {
      13: [px(13), '1.5'],
      15: [px(15), '1.5'],
      16: ['var(--body)', '1.5'],
      20: [px(20), '1.3'],
      25: [px(25), '1.2'],
      32: [px(32), '1.2'],
      44: [px(44), '1.2'],
    },
    borderRadius: { none: '0', DEFAULT: '2px', full: '9999px' },
    boxShadow: { none: 'none', raised: '0 6px 24px rgb(0 0 0 / 0.22)' },
    extend: {
      // Spacing keeps 4 px steps: 2 4 6 10 16 are the rhythm 8 16 24 40 64.
      maxWidth: { form: '34em', text: '66ch', page: '1248px' },
      width: { margin: '300px' },
      minHeight: { target: '44px' },
      minWidth: { target: '44px' },
      transitionDuration: { state: '120ms', sheet: '200ms' },
    },
  },
};
