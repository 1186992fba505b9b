import type { ProblemIssue } from "../../shared/schemas/problem";

/** What a failed request says of itself. */
export interface ApiFailure {
  /** HTTP status; 0 where no answer came. */
  status: number;
  /** Stable: `not_found`, `stale_revision`; `offline` where no answer came, `unreadable` where it made no sense. */
  code: string;
  /** What is wrong and what to do, for the person. */
  message: string;
  issues?: ProblemIssue[];
  requestId?: string;
  /** The answer as it came, for members that only one route has. */
  body?: unknown;
}

/** A request that failed, with what the server said of it. */
export class ApiError extends Error {
  readonly status: number;
  readonly code: string;
  readonly issues: readonly ProblemIssue[];
  readonly requestId: string | null;
  readonly body: unknown;

  constructor({ status, code, message, issues = [], requestId, body }: ApiFailure) {
    super(message);
    this.name = "ApiError";
    this.status = status;
    this.code = code;
    this.issues = issues;
    this.requestId = requestId ?? null;
    this.body = body;
  }

  /** No answer came: no connection, or no server at its end. */
  get isOffline(): boolean {
    return this.code === "offline";
  }

  /** What is wrong with one field of what was sent; `path` is the field's name. */
  issueAt(path: string): string | undefined {
    return this.issues.find((issue) => issue.path === path)?.message;
  }
}

/** The sentence to show for whatever was thrown. */
export function failureSentence(error: unknown): string {
  if (error instanceof ApiError) return error.message;
  return "Something in the page itself failed. Load the page again; what was saved is safe.";
}
