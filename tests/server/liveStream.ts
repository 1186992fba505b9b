import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { liveEvent, type LiveEvent } from "../../shared/schemas/live";
import type { Actor } from "../../server/policies/actor";
import type { TestServer } from "./testServer";

/** The test server, listening: a stream needs a connection that stays. */
export async function listen(server: TestServer): Promise<{ origin: string; close: () => Promise<void> }> {
  const http: Server = createServer(server.app);
  await new Promise<void>((resolve) => http.listen(0, "127.0.0.1", resolve));
  const { port } = http.address() as AddressInfo;
  return {
    origin: `http://127.0.0.1:${port}`,
    close: () =>
      new Promise((resolve) => {
        http.close(() => resolve());
        http.closeAllConnections();
      }),
  };
}

export interface OpenedStream {
  status: number;
  type: string | null;
  /** Resolves with the next event that fits, among those not yet taken; fails after two seconds. */
  next: (fits: (event: LiveEvent) => boolean) => Promise<LiveEvent>;
  /** Resolves when the server has ended the stream. */
  ended: Promise<void>;
  close: () => void;
}

/** Opens the events of a notebook in somebody's name; null: signed out. */
export async function openStream(
  server: TestServer,
  origin: string,
  notebookId: string,
  user: Actor | null,
): Promise<OpenedStream> {
  const stop = new AbortController();
  const response = await fetch(`${origin}/api/notebooks/${notebookId}/events`, {
    headers: user ? { Cookie: await server.cookieOf(user) } : {},
    signal: stop.signal,
  });
  const events: LiveEvent[] = [];
  let wake = (): void => undefined;
  const read = async (): Promise<void> => {
    let text = "";
    for await (const chunk of response.body!.pipeThrough(new TextDecoderStream())) {
      text += chunk;
      const blocks = text.split("\n\n");
      text = blocks.pop()!;
      for (const block of blocks) {
        const data = /^data: (.*)$/m.exec(block)?.[1];
        if (data !== undefined) events.push(liveEvent.parse(JSON.parse(data)));
      }
      wake();
    }
  };
  const ended = response.ok ? read().catch(() => undefined) : Promise.resolve();

  const next: OpenedStream["next"] = async (fits) => {
    const deadline = Date.now() + 2_000;
    for (;;) {
      const index = events.findIndex(fits);
      if (index >= 0) return events.splice(0, index + 1).at(-1)!;
      if (Date.now() > deadline)
        throw new Error(`No such event within two seconds: ${JSON.stringify(events)}`);
      await new Promise<void>((resolve) => {
        wake = resolve;
        setTimeout(resolve, 50);
      });
    }
  };
  return {
    status: response.status,
    type: response.headers.get("content-type"),
    next,
    ended,
    close: () => stop.abort(),
  };
}
