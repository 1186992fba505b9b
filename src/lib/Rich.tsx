import type { RichText } from "./richText";

/** Rich text in a paragraph or a table. */
export function Rich({ text }: { text: RichText }) {
  return text.map((piece, index) => {
    if (typeof piece === "string") return piece;
    if ("sup" in piece) return <sup key={index}>{piece.sup}</sup>;
    return "sub" in piece ? <sub key={index}>{piece.sub}</sub> : <i key={index}>{piece.italic}</i>;
  });
}

/** The same inside an SVG text, where a shift must be taken back by what follows. */
export function RichTspans({ text }: { text: RichText }) {
  let shift = 0;
  return text.map((piece, index) => {
    const back = -shift;
    if (typeof piece === "string" || "italic" in piece) {
      shift = 0;
      const italic = typeof piece !== "string";
      return (
        <tspan key={index} dy={back} className={italic ? "strip-italic" : undefined}>
          {italic ? piece.italic : piece}
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
