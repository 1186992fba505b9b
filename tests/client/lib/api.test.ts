import { afterEach, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import { api, whenSignedOut } from "../../../src/lib/api";
import { ApiError } from "../../../src/lib/ApiError";
import { answerWith, problemAnswer } from "../answers";

const body = z.object({ title: z.string() });

afterEach(() => {
  whenSignedOut(null);
  vi.unstubAllGlobals();
});

async function failureOf(promise: Promise<unknown>): Promise<ApiError> {
  const error = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  expect(error).toBeInstanceOf(ApiError);
  return error as ApiError;
}

describe("an answer", () => {
  it("comes back parsed", async () => {
    answerWith({ "GET /notebooks/a": { body: { title: "Ilmara", more: 1 } } });
    expect(await api.get("/notebooks/a", body)).toEqual({ title: "Ilmara" });
  });

  it("without a body is enough for a deletion", async () => {
    answerWith({ "DELETE /notebooks/a": { status: 204 } });
    await expect(api.delete("/notebooks/a")).resolves.toBeUndefined();
  });

  it("of another shape than agreed is refused, not passed on", async () => {
    answerWith({ "GET /notebooks/a": { body: { name: "Ilmara" } } });
    expect((await failureOf(api.get("/notebooks/a", body))).code).toBe("unreadable");
  });

  it("that is no JSON is refused", async () => {
    vi.stubGlobal("fetch", async () => new Response("<html>", { status: 200 }));
    expect((await failureOf(api.get("/notebooks/a", body))).code).toBe("unreadable");
  });
});

describe("a request", () => {
  it("carries its body as JSON, and keeps to the same origin", async () => {
    const calls: RequestInit[] = [];
    vi.stubGlobal("fetch", async (_: string, init: RequestInit) => {
      calls.push(init);
      return new Response(JSON.stringify({ title: "b" }), { status: 201 });
    });
    await api.post("/notebooks", { title: "b" }, body);
    expect(calls[0]).toMatchObject({ method: "POST", body: '{"title":"b"}', credentials: "same-origin" });
    expect(calls[0]?.headers).toMatchObject({ "Content-Type": "application/json" });
  });

  it("that the page gave up ends in the signal's own error, not in one about the connection", async () => {
    const given = new AbortController();
    vi.stubGlobal("fetch", async () => {
      given.abort();
      throw given.signal.reason;
    });
    await expect(api.get("/a", body, { signal: given.signal })).rejects.toMatchObject({ name: "AbortError" });
  });
});

describe("a failure", () => {
  it("says what the problem document says", async () => {
    const issues = [{ path: "title", message: "A title is needed.", code: "too_small" }];
    answerWith({
      "POST /notebooks": problemAnswer(422, "invalid", "Something needs correcting.", { issues }),
    });
    const error = await failureOf(api.post("/notebooks", {}, body));
    expect(error).toMatchObject({ status: 422, code: "invalid", requestId: "request-1", isOffline: false });
    expect(error.message).toBe("Something needs correcting.");
    expect(error.issueAt("title")).toBe("A title is needed.");
    expect(error.issueAt("name")).toBeUndefined();
  });

  it("keeps the members that only one route has", async () => {
    answerWith({
      "PUT /notebooks/a/draft": problemAnswer(409, "stale_revision", "It moved on.", { current: 7 }),
    });
    expect((await failureOf(api.put("/notebooks/a/draft", {}, body))).body).toMatchObject({ current: 7 });
  });

  it("without any answer is told as no connection", async () => {
    answerWith({});
    expect(await failureOf(api.get("/a", body))).toMatchObject({
      status: 0,
      code: "offline",
      isOffline: true,
    });
  });

  it.each([502, 503, 504])("of a gateway (%s) is told as no connection", async (status) => {
    vi.stubGlobal("fetch", async () => new Response("Bad gateway", { status }));
    expect((await failureOf(api.get("/a", body))).isOffline).toBe(true);
  });

  it("in words that are no problem document is told as unreadable, with its status", async () => {
    answerWith({ "GET /a": { status: 500, body: { oops: true } } });
    expect(await failureOf(api.get("/a", body))).toMatchObject({ status: 500, code: "unreadable" });
  });
});

describe("a session that has ended", () => {
  const signedOut = problemAnswer(401, "signed_out", "Sign in to go on.");

  it("lets the request wait, and sends it once more when the same person is back", async () => {
    let isSignedIn = false;
    const asked = answerWith({
      "PUT /notebooks/a/draft": () => (isSignedIn ? { body: { title: "kept" } } : signedOut),
    });
    whenSignedOut(async () => {
      isSignedIn = true;
      return true;
    });
    expect(await api.put("/notebooks/a/draft", { revision: 3 }, body)).toEqual({ title: "kept" });
    expect(asked.map(({ body: sent }) => sent)).toEqual([{ revision: 3 }, { revision: 3 }]);
  });

  it("fails the request when another person has signed in", async () => {
    const asked = answerWith({ "GET /notebooks": signedOut });
    whenSignedOut(async () => false);
    expect((await failureOf(api.get("/notebooks", body))).status).toBe(401);
    expect(asked).toHaveLength(1);
  });

  it("is not mistaken for a wrong password", async () => {
    const ask = vi.fn(async () => true);
    answerWith({ "POST /session": problemAnswer(401, "wrong_credentials", "Not right.") });
    whenSignedOut(ask);
    expect((await failureOf(api.post("/session", {}, body))).code).toBe("wrong_credentials");
    expect(ask).not.toHaveBeenCalled();
  });
});
