/** Text with the few marks that numbers, units and formulas need, written once and rendered as HTML, SVG, plain text or for a figure. */
export type RichPiece = string | { sup: string } | { sub: string } | { italic: string } | { code: string };
export type RichText = readonly RichPiece[];

const superscripts: Record<string, string> = {
  "0": "⁰",
  "1": "¹",
  "2": "²",
  "3": "³",
  "4": "⁴",
  "5": "⁵",
  "6": "⁶",
  "7": "⁷",
  "8": "⁸",
  "9": "⁹",
  "−": "⁻",
};

/** Whole exponents as superscript digits; others, which have none, after a caret: "10^−45.8". */
function plainExponent(text: string): string {
  const raised = [...text].map((character) => superscripts[character]);
  return raised.every((character) => character !== undefined) ? raised.join("") : `^${text}`;
}

/** For titles, labels read aloud and messages. */
export function plainText(rich: RichText): string {
  return rich
    .map((piece) => {
      if (typeof piece === "string") return piece;
      if ("sup" in piece) return plainExponent(piece.sup);
      if ("sub" in piece) return piece.sub;
      return "code" in piece ? piece.code : piece.italic;
    })
    .join("");
}

/** For the labels of a figure, which know a little HTML. */
export function figureText(rich: RichText): string {
  const escape = (text: string) => text.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;");
  return rich
    .map((piece) => {
      if (typeof piece === "string") return escape(piece);
      if ("sup" in piece) return `<sup>${escape(piece.sup)}</sup>`;
      if ("sub" in piece) return `<sub>${escape(piece.sub)}</sub>`;
      return "code" in piece ? escape(piece.code) : `<i>${escape(piece.italic)}</i>`;
    })
    .join("");
}
