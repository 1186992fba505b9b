import {
  choosableMailKinds,
  type KeptMailResponse,
  type MailChoicesResponse,
} from "../../shared/schemas/mail";
import type { KeptMailRow, MailChoiceRow } from "../db/reads/mail";

/** What a person has not spoken of, they want. */
export function presentMailChoices(rows: MailChoiceRow[]): MailChoicesResponse {
  const unwanted = new Set(rows.filter(({ isWanted }) => !isWanted).map(({ kind }) => kind));
  const entries = choosableMailKinds.map((kind) => [kind, !unwanted.has(kind)]);
  return Object.fromEntries(entries) as MailChoicesResponse;
}

export function presentKeptMail(rows: KeptMailRow[]): KeptMailResponse {
  return rows.map(({ id, toAddress, subject, plain, takenAt }) => ({
    id,
    to: toAddress,
    subject,
    plain,
    takenAt: takenAt.toISOString(),
  }));
}
