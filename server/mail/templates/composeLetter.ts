import type { Letter } from "../../commands/postLetter";
import type { MailKind } from "../../../shared/schemas/mail";

export interface LetterTo {
  address: string;
  /** null where the address has no account. */
  userId: string | null;
}

export interface LetterText {
  kind: MailKind;
  subject: string;
  paragraphs: readonly string[];
  /** What to do, as a link. */
  link: { label: string; href: string };
  /** Quiet, at the end: why this came, and how to have no more of it. */
  foot: string;
}

/** Sets a letter as plain text and as HTML. All text is taken as plain and escaped. */
export function composeLetter(to: LetterTo, { kind, subject, paragraphs, link, foot }: LetterText): Letter {
  return {
    kind,
    toAddress: to.address,
    toUserId: to.userId,
    subject: oneLine(subject),
    plain: [...paragraphs, `${link.label}:\n${link.href}`, foot, "Tenuity"].join("\n\n"),
    html: [
      '<!doctype html><html lang="en"><head><meta charset="utf-8"></head>',
      '<body style="margin:0;padding:32px 24px;background:#f8f5ec;color:#1c2233;font:17px/1.5 Georgia,serif">',
      '<div style="max-width:34em;margin:0 auto">',
      ...paragraphs.map((text) => `<p style="margin:0 0 1em">${escapeHtml(text)}</p>`),
      `<p style="margin:0 0 1em"><a href="${escapeHtml(link.href)}" style="color:#24478f">${escapeHtml(link.label)}</a></p>`,
      `<p style="margin:2em 0 0;padding-top:.8em;border-top:1px solid #cfc9b8;color:#5a5f6d;font-size:14px">${escapeHtml(foot)}</p>`,
      "</div></body></html>",
    ].join("\n"),
  };
}

export function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}

/** A title may hold what a header line may not. */
const oneLine = (text: string): string => text.replace(/\s+/g, " ").trim();
