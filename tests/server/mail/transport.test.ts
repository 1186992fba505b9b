import { createServer, type AddressInfo, type Socket } from "node:net";
import { afterEach, describe, expect, it } from "vitest";
import { deliveryOf, smtpTransport, type Transport } from "../../../server/mail/transport";

/** What the mail server answers to a command that begins so; null ends the connection. */
type Answers = Record<string, string | null>;

const usual: Answers = {
  EHLO: "250 ok",
  MAIL: "250 ok",
  RCPT: "250 ok",
  DATA: "354 go on",
  END: "250 taken",
  RSET: "250 ok",
  QUIT: "221 bye",
};

const letter = {
  id: "8f2f8c3e-93b8-4c57-9d5e-0d5f0b7a1f11",
  kind: "group_invitation",
  toAddress: "n.harcourt@vell.example",
  toUserId: null,
  subject: "An invitation",
  plain: "Come and see.",
  html: "<p>Come and see.</p>",
  state: "sending",
  tries: 1,
  createdAt: new Date(),
  dueAt: new Date(),
  sentAt: null,
  failure: null,
} as const;

let close: (() => void) | null = null;
afterEach(() => close?.());

/** A mail server in a few lines (RFC 5321), and what it was told. */
async function startMailServer(answers: Answers): Promise<{ transport: Transport; taken: string[] }> {
  const taken: string[] = [];
  const sockets = new Set<Socket>();
  const server = createServer((socket) => {
    sockets.add(socket);
    let text = "";
    let body: string[] | null = null;
    socket.on("error", () => undefined);
    socket.write("220 here\r\n");
    socket.on("data", (data) => {
      text += data.toString();
      const lines = text.split("\r\n");
      text = lines.pop()!;
      for (const line of lines) {
        if (body && line !== ".") {
          body.push(line);
          continue;
        }
        const answer = answers[body ? "END" : line.slice(0, 4).toUpperCase()];
        if (body && answer?.startsWith("250")) taken.push(body.join("\n"));
        body = null;
        if (answer === null || answer === undefined) {
          socket.destroy();
          return;
        }
        if (answer.startsWith("354")) body = [];
        socket.write(`${answer}\r\n`);
      }
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  const transport = smtpTransport({
    host: "127.0.0.1",
    port,
    user: undefined,
    password: undefined,
    from: "Tenuity <post@tenuity.example>",
  });
  close = () => {
    transport.close();
    sockets.forEach((socket) => socket.destroy());
    server.close();
  };
  return { transport, taken };
}

describe("sending by a mail server", () => {
  it("hands a letter over in text and HTML", async () => {
    const { transport, taken } = await startMailServer(usual);
    expect(await transport.deliver(letter)).toEqual({ outcome: "sent" });
    expect(taken).toHaveLength(1);
    expect(taken[0]).toMatch(/To: n\.harcourt@vell\.example/);
    expect(taken[0]).toMatch(/text\/plain[\s\S]*Come and see\.[\s\S]*text\/html/);
  });

  it.each([
    ["an address refused for now", { RCPT: "450 busy" }, "later"],
    ["an address refused for good", { RCPT: "550 unknown" }, "never"],
    ["a letter refused for now", { END: "451 try later" }, "later"],
    ["a letter refused for good", { END: "554 no" }, "never"],
    ["a connection that ends before anything is said", { EHLO: null }, "later"],
    ["a connection that ends once the letter is out", { END: null }, "never"],
  ] as const)("%s: %j, %s", async (_what, answers, outcome) => {
    const { transport, taken } = await startMailServer({ ...usual, ...answers });
    expect((await transport.deliver(letter)).outcome).toBe(outcome);
    expect(taken).toEqual([]);
  });

  it("no server there is worth another try", async () => {
    const { transport } = await startMailServer(usual);
    close!();
    expect((await transport.deliver(letter)).outcome).toBe("later");
  });

  it("whatever else goes wrong is not tried again", () => {
    const delivery = deliveryOf(new Error("out of memory"));
    expect(delivery).toMatchObject({
      outcome: "never",
      failure: expect.stringContaining("may have arrived"),
    });
  });
});
