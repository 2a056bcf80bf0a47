/** What jsdom lacks and the controls ask for: media queries (a wide window) and CSS.escape. */
export function stubBrowser(): void {
  window.matchMedia = () =>
    ({
      matches: false,
      addEventListener: () => undefined,
      removeEventListener: () => undefined,
    }) as unknown as MediaQueryList;
  Object.assign(window, { CSS: { escape: (value: string) => value, supports: () => false } });
}
