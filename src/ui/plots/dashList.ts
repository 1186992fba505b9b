import type { Shape } from "plotly.js";

type FigureDash = NonNullable<NonNullable<Shape["line"]>["dash"]>;

/** A list of lengths, which the library takes though its types name only a few patterns. */
export const dashList = (dash: string): FigureDash =>
  (dash === "" ? "solid" : dash.replace(/ /g, "px,").concat("px")) as FigureDash;
