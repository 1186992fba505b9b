declare module "@citation-js/core" {
  export const plugins: {
    output: { format(form: string, data: readonly object[], options?: Record<string, string>): string };
  };
}
declare module "@citation-js/name" {
  export function parse(name: string): Record<string, string>;
}
declare module "@citation-js/plugin-bibtex";
declare module "@citation-js/plugin-ris";
declare module "@citation-js/plugin-csl";
