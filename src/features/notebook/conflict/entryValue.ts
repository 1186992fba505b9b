/** What is written of an entry after its key, which stands beside it; a text that does not begin with the key, whole. */
export function entryValue(text: string | null, label: string): string | null {
  if (text === null) return null;
  const [head, ...rest] = text.split("=");
  return head?.trim() === label ? rest.join("=").trim() : text;
}
