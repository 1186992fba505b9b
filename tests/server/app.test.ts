import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { brotliCompressSync, gzipSync } from "node:zlib";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { problem } from "../../shared/schemas/problem";
import { buildUser } from "../factories/buildUser";
import { startTestServer, type TestServer } from "./testServer";

let folder: string;
let server: TestServer;
beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), "tenuity-client-"));
  mkdirSync(path.join(folder, "assets"));
  const script = "console.log('a page');\n".repeat(100);
  writeFileSync(
    path.join(folder, "index.html"),
    "<!doctype html><html><head><title>Tenuity</title></head></html>",
  );
  writeFileSync(path.join(folder, "assets/page-abc123.js"), script);
  writeFileSync(path.join(folder, "assets/page-abc123.js.br"), brotliCompressSync(script));
  writeFileSync(path.join(folder, "assets/page-abc123.js.gz"), gzipSync(script));
  server = await startTestServer({ clientFolder: folder });
});
afterAll(async () => {
  await server.close();
  rmSync(folder, { recursive: true, force: true });
});

describe("the page", () => {
  it.each(["/", "/notebooks", "/notebooks/0000?cell=1", "/sign-in"])(
    "is served at %s, asked for anew each time",
    async (url) => {
      const response = await server.signedOut.get(url).set("Accept", "text/html");
      expect(response.status).toBe(200);
      expect(response.type).toBe("text/html");
      expect(response.headers["cache-control"]).toBe("no-store");
    },
  );

  it.each([
    ["br, gzip", "br"],
    ["gzip", "gzip"],
    ["identity", undefined],
  ])("its files come as %s allows, to be kept for good", async (accepted, encoding) => {
    const response = await server.signedOut.get("/assets/page-abc123.js").set("Accept-Encoding", accepted);
    expect(response.status).toBe(200);
    expect(response.type).toBe("text/javascript");
    expect(response.headers["content-encoding"]).toBe(encoding);
    expect(response.headers["cache-control"]).toBe("public, max-age=31536000, immutable");
  });

  it.each(["/assets/gone.js", "/../package.json", "/%2e%2e/package.json", "/.env"])(
    "has no %s",
    async (url) => {
      const response = await server.signedOut.get(url).set("Accept", "text/html");
      expect([400, 403, 404]).toContain(response.status);
      expect(response.text).not.toContain("dependencies");
    },
  );

  it("is told the token of its style elements, another each time", async () => {
    const [first, second] = [await server.signedOut.get("/"), await server.signedOut.get("/")];
    const nonce = /<meta property="csp-nonce" nonce="([^"]+)"/.exec(first.text)![1]!;
    expect(first.headers["content-security-policy"]).toContain(`'nonce-${nonce}'`);
    expect(second.text).not.toContain(nonce);
    expect((await server.signedOut.get("/index.html")).headers.location).toBe("/");
  });

  it("allows no inline script and no frame", async () => {
    const { headers } = await server.signedOut.get("/");
    const policy = headers["content-security-policy"]!;
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toContain("unsafe-eval");
    expect(headers["x-content-type-options"]).toBe("nosniff");
    expect(headers["x-powered-by"]).toBeUndefined();
    expect(headers["strict-transport-security"]).toBeUndefined();
  });
});

describe("the API", () => {
  it("is well", async () => {
    expect((await server.signedOut.get("/healthz")).body).toEqual({ status: "ok" });
  });

  it("answers an unknown address with a problem, not with the page", async () => {
    const response = await server.signedOut.get("/api/nowhere").set("Accept", "text/html");
    expect(response.status).toBe(404);
    expect(problem.parse(response.body).code).toBe("not_found");
  });

  it("answers a broken address with 400", async () => {
    const agent = await server.as(await buildUser(server.db));
    expect((await agent.get("/api/notebooks/%E0%A4%A")).status).toBe(400);
  });

  it.each([
    [{ "Sec-Fetch-Site": "cross-site" }, 403],
    [{ "Sec-Fetch-Site": "same-site" }, 403],
    [{ "Sec-Fetch-Site": "none" }, 403],
    [{ Origin: "https://elsewhere.example" }, 403],
    [{ Origin: "null" }, 403],
    [{ "Sec-Fetch-Site": "same-origin" }, 204],
    [{ Origin: "http://tenuity.example", Host: "tenuity.example" }, 204],
    [{}, 204],
  ])("takes a change from %o with %i", async (headers, status) => {
    const response = await server.signedOut.delete("/api/session").set(headers);
    expect(response.status).toBe(status);
  });

  it("compares with the public origin where one is set", async () => {
    const secure = await startTestServer({ db: server.db, origin: "https://tenuity.example" });
    const from = async (origin: string) =>
      (await secure.signedOut.delete("/api/session").set("Origin", origin)).status;
    expect(await from("https://tenuity.example")).toBe(204);
    expect(await from("http://tenuity.example")).toBe(403);
    const { headers } = await secure.signedOut.get("/healthz");
    expect(headers["strict-transport-security"]).toMatch(/max-age/);
    await secure.close();
  });
});
