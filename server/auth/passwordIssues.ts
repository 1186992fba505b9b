import type { ProblemIssue } from "../../shared/schemas/problem";

const bare = (text: string): string =>
  text
    .normalize("NFKC")
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]/gu, "");

/** Whether the text is one piece repeated, such as "aaaaaaaaaaaa" or "tenuitytenuity". */
function isRepetition(text: string, piece: string): boolean {
  return text !== "" && piece !== "" && text.replaceAll(piece, "") === "";
}

/** What is wrong with a password besides its length: it says what everyone knows, with or without digits. */
export function passwordIssues({
  name,
  email,
  password,
}: Record<"name" | "email" | "password", string>): ProblemIssue[] {
  const secret = bare(password);
  const known = [email, email.slice(0, email.lastIndexOf("@")), name, ...name.split(/\s+/), "tenuity"].map(
    bare,
  );
  const letters = secret.replace(/\p{N}/gu, "");
  const isKnown = known.some((piece) => isRepetition(secret, piece) || isRepetition(letters, piece));
  const isOneCharacter = new Set(secret).size < 2;
  if (!isKnown && !isOneCharacter) return [];
  const message =
    "This password is easily guessed. Choose one without your name, your address or one repeated character.";
  return [{ path: "password", message, code: "guessable" }];
}
