/** Below this the margin goes under its cells; the same number as in `notebook.css`. */
export const noMargin = "(max-width: 1351.98px)";
