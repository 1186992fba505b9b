export interface NotePart {
  text: string;
  /** A word of the cell language, set as it is written there. */
  isCode: boolean;
}

/** A note's message as pieces: what stands between asterisks are words of the language. */
export function noteParts(message: string): NotePart[] {
  return message
    .split(/\*([^*\n]+)\*/)
    .map((text, index) => ({ text, isCode: index % 2 === 1 }))
    .filter(({ text }) => text !== "");
}

/** The complaint, which is the first sentence, and what follows it. */
export function complaintAndRest(message: string): [string, string] {
  const end = /[.;:](?=\s)/.exec(message);
  if (!end) return [message, ""];
  return [message.slice(0, end.index + 1), message.slice(end.index + 1).trim()];
}
