import type { Logger } from "pino";
import {
  claimLetter,
  closeHalfSent,
  giveUp,
  markSent,
  putBack,
  type ClaimedLetter,
} from "../commands/sendLetters";
import type { Db } from "../db/client";
import type { Transport } from "../mail/transport";

export interface Post {
  /** Says that there may be letters: call it after the transaction that wrote one. */
  request(): void;
  /** Sends what is due, and looks again every half minute. */
  start(): void;
  /** Resolves when nothing asked for is left. */
  idle(): Promise<void>;
  /** Ends after the letter under way; the rest goes out after the next start. */
  close(): Promise<void>;
}

const halfMinute = 30_000;

/**
 * Sends letters beside the answers. A letter is marked as being sent before it is handed over, in a statement of its
 * own: whatever happens afterwards, it is not taken up again. So a letter goes out once at most; one whose fate nobody
 * knows counts as failed. Acts for the server itself: who gets a letter was decided where it was posted.
 */
export function createPost(parts: { db: Db; transport: Transport; logger: Logger }): Post {
  const { db, transport, logger } = parts;
  let running: Promise<void> | null = null;
  let isWanted = false;
  let isClosed = false;
  let timer: NodeJS.Timeout | undefined;

  const send = async (letter: ClaimedLetter): Promise<void> => {
    const delivery = await transport.deliver(letter);
    if (delivery.outcome === "sent") return markSent(db, letter, new Date());
    const { failure } = delivery;
    logger.warn({ letterId: letter.id, kind: letter.kind, failure }, "a letter could not be sent");
    if (delivery.outcome === "later") await putBack(db, letter, { failure, at: new Date() });
    else await giveUp(db, letter, failure);
  };

  const sendAll = async (): Promise<void> => {
    const closed = await closeHalfSent(db, new Date());
    if (closed > 0) logger.warn({ letters: closed }, "letters were left half sent and are not sent again");
    while (!isClosed) {
      const letter = await claimLetter(db, new Date());
      if (!letter) break;
      await send(letter).catch((error: unknown) =>
        logger.error({ err: error, letterId: letter.id }, "what became of a letter was not written down"),
      );
    }
  };

  const run = async (): Promise<void> => {
    while (isWanted && !isClosed) {
      isWanted = false;
      await sendAll().catch((error: unknown) => logger.error({ err: error }, "the post failed"));
    }
    running = null;
  };

  const request = (): void => {
    if (isClosed) return;
    isWanted = true;
    running ??= run();
  };

  return {
    request,
    start: () => {
      request();
      timer = setInterval(request, halfMinute);
      timer.unref();
    },
    idle: async () => {
      while (running) await running;
    },
    close: async () => {
      isClosed = true;
      clearInterval(timer);
      await running;
      transport.close();
    },
  };
}
