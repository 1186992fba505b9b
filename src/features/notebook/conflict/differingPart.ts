/** A text cut where it begins and ends to differ from another one. */
export interface DifferingPart {
  before: string;
  part: string;
  after: string;
}

/** What of a text differs from the other, widened to whole words and numbers, for a wash under it. */
export function differingPart(text: string, other: string): DifferingPart {
  const most = Math.min(text.length, other.length);
  let from = 0;
  while (from < most && text[from] === other[from]) from += 1;
  let end = 0;
  while (end < most - from && text[text.length - 1 - end] === other[other.length - 1 - end]) end += 1;
  let to = text.length - end;
  if (from === to && text.length === other.length) return { before: text, part: "", after: "" };
  const isWord = (character: string | undefined): boolean =>
    character !== undefined && /[\w.^]/.test(character);
  while (from > 0 && isWord(text[from - 1]) && (isWord(text[from]) || from === to)) from -= 1;
  while (to < text.length && isWord(text[to]) && (isWord(text[to - 1]) || from === to)) to += 1;
  return { before: text.slice(0, from), part: text.slice(from, to), after: text.slice(to) };
}
