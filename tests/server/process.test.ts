import { spawn, type ChildProcess } from "node:child_process";
import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { notebookResponse } from "../../shared/schemas/notebooks";
import { buildDocument } from "../factories/buildDocument";
import { makeDatabaseFolder } from "./testDatabase";

const root = path.resolve(import.meta.dirname, "../..");

let folder: string;
let running: ChildProcess[];
beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), "tenuity-process-"));
  await makeDatabaseFolder(path.join(folder, "postgres"));
  running = [];
});
afterEach(async () => {
  for (const child of running) await end(child, "SIGKILL");
  rmSync(folder, { recursive: true, force: true });
});

/** The server in a process of its own, on this test's data folder; resolves when it listens or has ended. */
async function launch(): Promise<{ child: ChildProcess; origin: string; said: () => string }> {
  const child = spawn(process.execPath, ["--import", "tsx", "server/main.ts"], {
    cwd: root,
    env: {
      ...process.env,
      NODE_ENV: "test",
      PORT: "0",
      TENUITY_DATA: folder,
      TENUITY_DEMO: "off",
      LOG_LEVEL: "error",
    },
    stdio: ["ignore", "pipe", "pipe"],
  });
  running.push(child);
  let said = "";
  const origin = await new Promise<string>((resolve) => {
    const listen = (chunk: Buffer) => {
      said += chunk.toString();
      const port = /Tenuity is on http:\/\/localhost:(\d+)/.exec(said)?.[1];
      if (port) resolve(`http://127.0.0.1:${port}`);
    };
    child.stdout!.on("data", listen);
    child.stderr!.on("data", listen);
    child.once("exit", () => resolve(""));
  });
  return { child, origin, said: () => said };
}

function end(child: ChildProcess, signal: NodeJS.Signals): Promise<number | null> {
  return new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) return resolve(child.exitCode);
    child.once("exit", (code) => resolve(code));
    child.kill(signal);
  });
}

const person = {
  name: "Tamsin Orevale",
  email: "t.orevale@carrow.example",
  password: "copper kettle at dusk",
};

async function call(
  origin: string,
  cookie: string,
  method: string,
  url: string,
  body?: object,
): Promise<Response> {
  return fetch(`${origin}${url}`, {
    method,
    headers: { "Content-Type": "application/json", Cookie: cookie },
    ...(body ? { body: JSON.stringify(body) } : {}),
  });
}

const cookieIn = (response: Response): string => response.headers.getSetCookie()[0]!.split(";")[0]!;

async function signUp(origin: string): Promise<string> {
  return cookieIn(await call(origin, "", "POST", "/api/accounts", person));
}

async function createNotebook(origin: string, cookie: string): Promise<string> {
  const response = await call(origin, cookie, "POST", "/api/notebooks", { title: "Nirel", groupId: null });
  return notebookResponse.parse(await response.json()).id;
}

describe("the server as a process", () => {
  it(
    "has after kill -9 what it said was saved, and takes over its own stale lock",
    { timeout: 180_000 },
    async () => {
      const first = await launch();
      const cookie = await signUp(first.origin);
      const id = await createNotebook(first.origin, cookie);
      let saved = 1;
      const write = async (): Promise<void> => {
        for (;;) {
          const document = buildDocument({ title: `Saved on revision ${saved}` });
          const body = { revision: saved, document };
          const response = await call(first.origin, cookie, "PUT", `/api/notebooks/${id}/draft`, body).catch(
            () => null,
          );
          if (!response?.ok) return;
          saved = ((await response.json()) as { revision: number }).revision;
        }
      };
      const writing = write();
      await new Promise((resolve) => setTimeout(resolve, 1500));
      await end(first.child, "SIGKILL");
      await writing.catch(() => undefined);
      expect(saved).toBeGreaterThan(1);
      expect(existsSync(path.join(folder, "tenuity.lock"))).toBe(true);

      const second = await launch();
      const after = await call(second.origin, cookie, "GET", `/api/notebooks/${id}`);
      const notebook = notebookResponse.parse(await after.json());
      // The one that was under way may have been saved too, without its answer coming through.
      expect([saved, saved + 1]).toContain(notebook.revision);
      expect(notebook.title).toBe(`Saved on revision ${notebook.revision - 1}`);
    },
  );

  it(
    "refuses a second process on its folder, and stops cleanly when told",
    { timeout: 180_000 },
    async () => {
      const first = await launch();
      const cookie = await signUp(first.origin);
      const id = await createNotebook(first.origin, cookie);

      const second = await launch();
      expect(await end(second.child, "SIGTERM")).toBe(1);
      expect(second.said()).toMatch(new RegExp(`in use by process ${first.child.pid}`));
      expect((await call(first.origin, cookie, "GET", `/api/notebooks/${id}`)).status).toBe(200);

      expect(await end(first.child, "SIGTERM")).toBe(0);
      expect(existsSync(path.join(folder, "tenuity.lock"))).toBe(false);

      const third = await launch();
      const { email, password } = person;
      const signIn = await call(third.origin, "", "POST", "/api/session", { email, password });
      expect(signIn.status).toBe(201);
      expect((await call(third.origin, cookieIn(signIn), "GET", `/api/notebooks/${id}`)).status).toBe(200);
    },
  );
});
