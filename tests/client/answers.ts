/** A stand-in for the server in tests of pages: answers by method and path, and notes what was asked. */
import { vi } from "vitest";

export interface Answer {
  status?: number;
  body?: unknown;
}

export type Answers = Record<string, Answer | ((body: unknown) => Answer)>;

export interface Asked {
  method: string;
  path: string;
  body: unknown;
}

/** Replaces `fetch`; `answers` is keyed "GET /notebooks", without the query. */
export function answerWith(answers: Answers): Asked[] {
  const asked: Asked[] = [];
  vi.stubGlobal("fetch", async (input: string, init: RequestInit = {}) => {
    const method = init.method ?? "GET";
    const path = input.replace(/^\/api/, "");
    const body: unknown = typeof init.body === "string" ? JSON.parse(init.body) : undefined;
    asked.push({ method, path, body });
    const found = answers[`${method} ${path.split("?")[0]}`];
    if (!found) throw new TypeError(`Nothing answers ${method} ${path}`);
    const { status = 200, body: answer } = typeof found === "function" ? found(body) : found;
    return new Response(answer === undefined ? null : JSON.stringify(answer), { status });
  });
  return asked;
}

/** A problem document as the server writes it. */
export function problemAnswer(status: number, code: string, detail: string, more: object = {}): Answer {
  return {
    status,
    body: { type: "about:blank", title: code, status, code, detail, requestId: "request-1", ...more },
  };
}
