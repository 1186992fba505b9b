import type { RichText } from "./richText";

/** Rich text in a paragraph or a table. */
export function Rich({ text }: { text: RichText }) {
  return text.map((piece, index) => {
    if (typeof piece === "string") return piece;
    if ("sup" in piece) return <sup key={index}>{piece.sup}</sup>;
    if ("sub" in piece) return <sub key={index}>{piece.sub}</sub>;
    return "code" in piece ? <code key={index}>{piece.code}</code> : <i key={index}>{piece.italic}</i>;
  });
}

/** The same inside an SVG text, where a shift must be taken back by what follows. */
export function RichTspans({ text }: { text: RichText }) {
  let shift = 0;
  return text.map((piece, index) => {
    const back = -shift;
    if (typeof piece === "string" || "italic" in piece || "code" in piece) {
      shift = 0;
      const words = typeof piece === "string" ? piece : "italic" in piece ? piece.italic : piece.code;
      const isItalic = typeof piece !== "string" && "italic" in piece;
      return (
        <tspan key={index} dy={back} fontStyle={isItalic ? "italic" : undefined}>
          {words}
        </tspan>
      );
    }
    shift = "sup" in piece ? -4 : 3;
    return (
      <tspan key={index} dy={back + shift} fontSize="0.72em">
        {"sup" in piece ? piece.sup : piece.sub}
      </tspan>
    );
  });
}
