/** A message cut after its complaint, which is the first sentence or what comes before a semicolon. */
export function complaintAndRest(message: string): [string, string] {
  const end = /(?<!\b[A-Z]|\bal)[.;](?=\s)/.exec(message);
  if (!end) return [message, ""];
  return [message.slice(0, end.index + 1), message.slice(end.index + 1).trim()];
}
