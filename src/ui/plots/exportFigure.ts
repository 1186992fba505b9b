import type { Data, Layout } from "plotly.js";
import { embeddedFonts } from "./embeddedFonts";

export interface FigureDrawing {
  data: Data[];
  layout: Partial<Layout>;
}

const paper = "#ffffff";
/** Dots per px of a figure that is printed at the width of a column. */
const pngScale = 3;

/** The figure as an SVG document that needs nothing from the page. */
export async function figureSvg({ data, layout }: FigureDrawing): Promise<string> {
  const { Plotly } = await import("./loadPlotly");
  const drawing = { data, layout: { ...layout, paper_bgcolor: paper } };
  const size = { width: layout.width ?? 736, height: layout.height ?? 486 };
  const url = await Plotly.toImage(drawing, { format: "svg", ...size });
  const svg = decodeURIComponent(url.slice(url.indexOf(",") + 1));
  const style = `<style>${await embeddedFonts()}.annotation-text{paint-order:stroke;stroke:${paper};stroke-width:4px;stroke-linejoin:round}</style>`;
  return svg.replace(/(<svg[^>]*>)/, `$1${style}`);
}

/** The same drawing as pixels, three to a px. */
export async function figurePng(drawing: FigureDrawing): Promise<Blob> {
  const image = new Image();
  image.src = URL.createObjectURL(new Blob([await figureSvg(drawing)], { type: "image/svg+xml" }));
  await image.decode();
  const canvas = document.createElement("canvas");
  canvas.width = (drawing.layout.width ?? 736) * pngScale;
  canvas.height = (drawing.layout.height ?? 486) * pngScale;
  canvas.getContext("2d")!.drawImage(image, 0, 0, canvas.width, canvas.height);
  URL.revokeObjectURL(image.src);
  return new Promise((resolve, reject) =>
    canvas.toBlob(
      (blob) => (blob ? resolve(blob) : reject(new Error("The figure could not be drawn as PNG."))),
      "image/png",
    ),
  );
}

/** Hands a file to the reader. */
export function saveFile(content: Blob, name: string): void {
  const link = document.createElement("a");
  link.href = URL.createObjectURL(content);
  link.download = name;
  link.click();
  // The browser has taken hold of the content by the next turn of its loop.
  setTimeout(() => URL.revokeObjectURL(link.href), 0);
}
