/** A media query that can be asked and followed; null where a document is not shown, as in tests. */
export function askMedia(query: string): MediaQueryList | null {
  return typeof window.matchMedia === "function" ? window.matchMedia(query) : null;
}
