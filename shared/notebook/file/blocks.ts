/** A notebook file as a row of top-level blocks, each with its place in the text. */
import { fromMarkdown } from "mdast-util-from-markdown";

/** Everything that only concerns the inside of a paragraph; blocks are found faster without. */
const blocksOnly = {
  disable: {
    null: [
      "attention",
      "autolink",
      "codeText",
      "hardBreakEscape",
      "htmlText",
      "labelEnd",
      "labelStartImage",
      "labelStartLink",
    ],
  },
};

export type FileBlock = { from: number; to: number } & (
  | { type: "title"; markdown: string }
  | { type: "fence"; word: string; label: string; text: string; isClosed: boolean; textLine: number }
  | { type: "proseComment"; label: string }
  | { type: "other" }
);

/**
 * The top-level blocks of CommonMark text whose line ends are all LF. Fences inside lists or quotations are part of
 * those; `label` is still encoded.
 */
export function fileBlocks(text: string): FileBlock[] {
  return fromMarkdown(text, { extensions: [blocksOnly] }).children.map((node): FileBlock => {
    const from = node.position!.start.offset!;
    const to = node.position!.end.offset!;
    const source = text.slice(from, to);
    if (node.type === "heading" && node.depth === 1) return { type: "title", markdown: source, from, to };
    if (node.type === "html") {
      const comment = /^<!--[ \t]*prose(?:[ \t]+([^\n]*?))?[ \t]*-->[ \t]*$/.exec(source);
      if (comment) return { type: "proseComment", label: comment[1] ?? "", from, to };
    }
    if (node.type === "code" && /^(```|~~~)/.test(source)) {
      const indent = node.position!.start.column - 1;
      return { from, to, ...readFence(source, indent), textLine: node.position!.start.line + 1 };
    }
    return { type: "other", from, to };
  });
}

function readFence(source: string, indent: number) {
  const lines = source.split("\n");
  const [, marks, word, label] = /^(`{3,}|~{3,})[ \t]*([^ \t]*)[ \t]*(.*?)[ \t]*$/s.exec(lines[0]!)!;
  const closing = new RegExp(`^ {0,3}${marks![0]}{${marks!.length},}[ \\t]*$`);
  const isClosed = lines.length > 1 && closing.test(lines.at(-1)!);
  const inside = lines.slice(1, isClosed ? -1 : undefined);
  const outdented =
    indent === 0 ? inside : inside.map((line) => line.replace(new RegExp(`^ {0,${indent}}`), ""));
  return { type: "fence" as const, word: word!, label: label!, text: outdented.join("\n"), isClosed };
}
