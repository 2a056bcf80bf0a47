/** Tokens live in src/styles/tokens.css as custom properties, so that light and dark share one set of names. */
export default {
  content: ['./src/**/*.{astro,ts,tsx}'],
  theme: { extend: {} },
};
