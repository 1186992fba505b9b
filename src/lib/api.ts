/** Speaks with the server: one function a verb; every answer is parsed by the schema the server is typed against. */
import type { ZodType } from "zod";
import { problem } from "../../shared/schemas/problem";
import { ApiError } from "./ApiError";

export interface RequestOptions {
  signal?: AbortSignal;
  /** Lets a small request outlive the page, for a last save. */
  keepalive?: boolean;
}

type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

/**
 * Asked when the server no longer knows the person. Answers true once the same person has signed in again, and the
 * request is then sent once more; false where it must fail.
 */
type SignInAgain = () => Promise<boolean>;

let signInAgain: SignInAgain | null = null;

/** Says who asks the person to sign in again when the session has ended. The provider of the session does. */
export function whenSignedOut(ask: SignInAgain | null): void {
  signInAgain = ask;
}

function offline(cause: unknown): ApiError {
  const error = new ApiError({
    status: 0,
    code: "offline",
    message: "No connection to the server. Check the network and try again.",
  });
  error.cause = cause;
  return error;
}

async function send(method: Method, path: string, body: unknown, options: RequestOptions): Promise<Response> {
  const headers: Record<string, string> = { Accept: "application/json, application/problem+json" };
  if (body !== undefined) headers["Content-Type"] = "application/json";
  try {
    return await fetch(`/api${path}`, {
      method,
      headers,
      body: body === undefined ? undefined : JSON.stringify(body),
      credentials: "same-origin",
      signal: options.signal,
      keepalive: options.keepalive,
    });
  } catch (error) {
    if (options.signal?.aborted) throw error;
    throw offline(error);
  }
}

async function readJson(response: Response, signal: AbortSignal | undefined): Promise<unknown> {
  let text: string;
  try {
    text = await response.text();
  } catch (error) {
    if (signal?.aborted) throw error;
    throw offline(error);
  }
  try {
    return text === "" ? undefined : (JSON.parse(text) as unknown);
  } catch {
    return undefined;
  }
}

function unreadable(response: Response, body: unknown): ApiError {
  return new ApiError({
    status: response.status,
    code: "unreadable",
    message:
      "The server’s answer could not be read. Load the page again: it may have been replaced by a newer one.",
    requestId: response.headers.get("x-request-id") ?? undefined,
    body,
  });
}

function failure(response: Response, body: unknown): ApiError {
  const parsed = problem.safeParse(body);
  if (parsed.success) {
    const { status, code, detail, issues, requestId } = parsed.data;
    return new ApiError({ status, code, message: detail, issues, requestId, body });
  }
  // A gateway that stands between the page and the server answers in words of its own.
  if (response.status >= 502 && response.status <= 504) {
    return new ApiError({
      status: response.status,
      code: "offline",
      message: "The server does not answer at the moment. Try again in a minute.",
      body,
    });
  }
  return unreadable(response, body);
}

async function request<Answer>(
  method: Method,
  path: string,
  body: unknown,
  schema: ZodType<Answer> | null,
  options: RequestOptions = {},
): Promise<Answer> {
  let response = await send(method, path, body, options);
  const concernsSession = path === "/session" || path.startsWith("/session/") || path === "/accounts";
  if (response.status === 401 && !concernsSession && signInAgain && (await signInAgain())) {
    options.signal?.throwIfAborted();
    response = await send(method, path, body, options);
  }

  const answer = await readJson(response, options.signal);
  if (!response.ok) throw failure(response, answer);
  if (schema === null) return undefined as Answer;
  const parsed = schema.safeParse(answer);
  if (!parsed.success) throw unreadable(response, answer);
  return parsed.data;
}

/** Paths begin after `/api`. A request ends in the parsed answer, an `ApiError`, or the signal's own error. */
export const api = {
  get: <Answer>(path: string, schema: ZodType<Answer>, options?: RequestOptions) =>
    request("GET", path, undefined, schema, options),
  post: <Answer>(path: string, body: unknown, schema: ZodType<Answer>, options?: RequestOptions) =>
    request("POST", path, body, schema, options),
  put: <Answer>(path: string, body: unknown, schema: ZodType<Answer>, options?: RequestOptions) =>
    request("PUT", path, body, schema, options),
  patch: <Answer>(path: string, body: unknown, schema: ZodType<Answer>, options?: RequestOptions) =>
    request("PATCH", path, body, schema, options),
  /** For answers without a body. */
  delete: (path: string, options?: RequestOptions) => request<void>("DELETE", path, undefined, null, options),
};
