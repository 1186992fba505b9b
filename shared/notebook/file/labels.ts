/** Names and titles as they stand in Markdown, where some characters mean something else. */
import { fromMarkdown } from "mdast-util-from-markdown";

/**
 * A name as it stands in an info string or a comment: what Markdown or the comment might read is written as numeric
 * character references. Proper names (letters, digits, `_`) come through unchanged.
 */
export function encodeLabel(name: string): string {
  return name.replace(/^ | $|[^\P{ASCII}A-Za-z0-9_ ]/gu, (character) => `&#${character.codePointAt(0)};`);
}

/** The inverse of `encodeLabel`; backslash escapes of hand-written files are decoded as well. */
export function decodeLabel(label: string): string {
  return label.replace(/&#(\d{1,3});|\\([!-/:-@[-`{-~])/g, (whole, code?: string, escaped?: string) => {
    if (escaped !== undefined) return escaped;
    const decoded = Number(code);
    return decoded >= 32 && decoded < 127 ? String.fromCharCode(decoded) : whole;
  });
}

/** A title as the text of a heading. */
export function encodeTitle(title: string): string {
  return title.replace(/[\\`*_[\]<>&#]/g, "\\$&").replace(/^ | $/g, "&#32;");
}

/** The plain text of a heading's Markdown. */
export function decodeTitle(markdown: string): string {
  return plainText(fromMarkdown(markdown)).replace(/\p{Cc}+/gu, " ");
}

/** The text in a piece of a Markdown tree, marks left out. */
function plainText(node: object): string {
  if ("value" in node && typeof node.value === "string") return node.value;
  if ("alt" in node && typeof node.alt === "string") return node.alt;
  return "children" in node && Array.isArray(node.children) ? node.children.map(plainText).join("") : "";
}
