/** The way out for letters: a mail server by SMTP, or a drawer where there is none. */
import { createTransport } from "nodemailer";
import { keepMail } from "../commands/keepMail";
import type { ClaimedLetter } from "../commands/sendLetters";
import type { Db } from "../db/client";
import type { SmtpSettings } from "../env";

/**
 * What became of a letter. `later`: surely not taken, worth another try. `never`: refused for good, or nobody knows
 * whether it was taken, so that another try could send it twice.
 */
export type Delivery = { outcome: "sent" } | { outcome: "later" | "never"; failure: string };

export interface Transport {
  deliver(letter: ClaimedLetter): Promise<Delivery>;
  close(): void;
}

/** How long the mail server may be silent before a connection is given up, in ms. */
const silence = 30_000;

export function smtpTransport({ host, port, user, password, from }: SmtpSettings): Transport {
  const mailer = createTransport({
    host,
    port,
    secure: port === 465,
    ...(user === undefined ? {} : { auth: { user, pass: password ?? "" } }),
    connectionTimeout: silence,
    greetingTimeout: silence,
    socketTimeout: 2 * silence,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return {
    deliver: async ({ id, toAddress, subject, plain, html }) => {
      try {
        // Without a letter: what fails here has surely sent nothing.
        await mailer.verify();
      } catch (error) {
        return { outcome: "later", failure: (error as Error).message };
      }
      try {
        await mailer.sendMail({
          from,
          // As an object: an address is one reader, whatever characters it has.
          to: { name: "", address: toAddress },
          subject,
          text: plain,
          html,
          messageId: `<${id}@tenuity.invalid>`,
          headers: { "Auto-Submitted": "auto-generated" },
        });
        return { outcome: "sent" };
      } catch (error) {
        return deliveryOf(error);
      }
    },
    close: () => mailer.close(),
  };
}

/** What a failure to hand a letter over says of it: the mail server's answer, 4xx for now and 5xx for good, or none. */
export function deliveryOf(error: unknown): Delivery {
  const { message, responseCode } = error as { message: string; responseCode?: number };
  if (responseCode === undefined)
    return { outcome: "never", failure: `It may have arrived; the connection ended: ${message}` };
  return { outcome: responseCode < 500 ? "later" : "never", failure: message };
}

/** Where no mail server is set: keeps letters in the database, for the development page. */
export function drawerTransport(db: Db): Transport {
  return {
    deliver: async ({ id, toAddress, subject, plain, html }) => {
      await keepMail(db, { id, toAddress, subject, plain, html, takenAt: new Date() });
      return { outcome: "sent" };
    },
    close: () => undefined,
  };
}
