import type { RichText } from "../../../lib/richText";

/** Rich text as nodes, for what stands inside an editor. */
export function richNodes(text: RichText): (string | HTMLElement)[] {
  return text.map((piece) => {
    if (typeof piece === "string") return piece;
    if ("sup" in piece) return element("sup", piece.sup);
    if ("sub" in piece) return element("sub", piece.sub);
    return "code" in piece ? element("code", piece.code) : element("i", piece.italic);
  });
}

function element(name: string, text: string): HTMLElement {
  const node = document.createElement(name);
  node.textContent = text;
  return node;
}
