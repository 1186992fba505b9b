import { spawn, type ChildProcess } from "node:child_process";
import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { chromium, type Browser, type BrowserContext, type Page } from "playwright-core";

const root = path.resolve(import.meta.dirname, "../..");

const browserPaths = ["/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];

export async function launchBrowser(): Promise<Browser> {
  const executablePath = browserPaths.find(existsSync);
  if (!executablePath)
    throw new Error(`No chromium at ${browserPaths.join(", ")}. Install the package chromium.`);
  return chromium.launch({
    executablePath,
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
    ],
  });
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() =>
        address && typeof address === "object" ? resolve(address.port) : reject(new Error("no port")),
      );
    });
  });
}

export interface RunningServer {
  origin: string;
  dataFolder: string;
  /** Ends the process at once, as a power switch would; the data folder stays. */
  kill(): Promise<void>;
  /** Starts again on the same data folder and port. */
  restart(): Promise<void>;
  /** Ends the process and removes the data folder. */
  remove(): Promise<void>;
}

/** The production build on a data folder of its own, with the demonstration on. */
export async function startServer(): Promise<RunningServer> {
  const dataFolder = mkdtempSync(path.join(tmpdir(), "tenuity-e2e-"));
  const port = await freePort();
  const origin = `http://127.0.0.1:${port}`;
  let child: ChildProcess | null = null;

  const start = async (): Promise<void> => {
    let said = "";
    child = spawn(process.execPath, ["dist/server/main.js"], {
      cwd: root,
      env: {
        ...process.env,
        NODE_ENV: "development",
        PORT: String(port),
        TENUITY_DATA: dataFolder,
        TENUITY_DEMO: "on",
        TZ: "UTC",
      },
      stdio: ["ignore", "pipe", "pipe"],
    });
    child.stdout?.on("data", (chunk: Buffer) => (said += chunk.toString()));
    child.stderr?.on("data", (chunk: Buffer) => (said += chunk.toString()));
    for (let tries = 0; tries < 600; tries += 1) {
      if (child.exitCode !== null) throw new Error(`The server ended with ${child.exitCode}:\n${said}`);
      const answer = await fetch(`${origin}/healthz`).catch(() => null);
      if (answer?.ok) return;
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
    throw new Error(`The server did not answer within a minute:\n${said}`);
  };

  const end = (signal: NodeJS.Signals): Promise<void> =>
    new Promise((resolve) => {
      if (!child || child.exitCode !== null || child.signalCode !== null) return resolve();
      child.once("exit", () => resolve());
      child.kill(signal);
    });

  await start();
  return {
    origin,
    dataFolder,
    kill: () => end("SIGKILL"),
    restart: async () => {
      await end("SIGKILL");
      await start();
    },
    remove: async () => {
      await end("SIGTERM");
      rmSync(dataFolder, { recursive: true, force: true });
    },
  };
}

/**
 * A page of its own session; whatever the console or a script complains of is collected in `complaints`, but for refusals
 * and lost connections that a test brings about.
 */
export async function openPage(
  browser: Browser,
  options: Parameters<Browser["newContext"]>[0] = {},
): Promise<{ page: Page; context: BrowserContext; complaints: string[] }> {
  const context = await browser.newContext({
    viewport: { width: 1440, height: 900 },
    timezoneId: "UTC",
    ...options,
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on("pageerror", (error) => complaints.push(String(error)));
  page.on("console", (message) => {
    if (
      message.type() === "error" &&
      !/status of (401|404|409|422|429|503)|ERR_CONNECTION_REFUSED|ERR_INTERNET_DISCONNECTED/.test(
        message.text(),
      )
    )
      complaints.push(message.text());
  });
  return { page, context, complaints };
}

export async function signInAs(page: Page, origin: string, name: string): Promise<void> {
  await page.goto(origin);
  await page.getByRole("button", { name: new RegExp(name) }).click();
  await page.getByRole("heading", { name: "Notebooks", level: 1 }).waitFor();
}
