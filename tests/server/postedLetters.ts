import { eq } from "drizzle-orm";
import type { Db } from "../../server/db/client";
import { keptMail } from "../../server/db/tables/keptMail";
import type { TestServer } from "./testServer";

/** What has been sent to an address, oldest first, once the post is idle. */
export async function lettersTo(server: TestServer, address: string) {
  await server.post.idle();
  return keptLetters(server.db, address);
}

const keptLetters = (db: Db, address: string) =>
  db.select().from(keptMail).where(eq(keptMail.toAddress, address)).orderBy(keptMail.takenAt);

/** The token in the link of the last letter to an address. */
export async function lastTokenTo(server: TestServer, address: string): Promise<string> {
  const letter = (await lettersTo(server, address)).at(-1);
  const token = /\/invitation#([\w-]{43})\b/.exec(letter?.plain ?? "")?.[1];
  if (!token) throw new Error(`No invitation has gone to ${address}`);
  return token;
}
