import { STATUS_CODES } from "node:http";
import type { ErrorRequestHandler, Request } from "express";
import { ZodError } from "zod";
import { PhysicsDomainError } from "../../shared/physics/errors";
import type { Problem } from "../../shared/schemas/problem";
import { AppError, invalid } from "../errors";

/** What the framework and its parsers throw. */
interface HttpError {
  status: number;
  type?: string;
}

const isHttpError = (error: unknown): error is HttpError =>
  error instanceof Error && "status" in error && typeof error.status === "number" && error.status < 500;

/** What a parser of requests complains of, in words, by its own name for it. */
const parserComplaints: Record<string, { code: string; detail: string }> = {
  "entity.parse.failed": {
    code: "malformed_json",
    detail: "What was sent is not JSON. Check its brackets and quotes.",
  },
  "entity.too.large": { code: "too_large", detail: "What was sent is over 8 MB. Send less, or in parts." },
  "encoding.unsupported": {
    code: "unsupported_encoding",
    detail: "Send the body plain or with gzip, deflate or br.",
  },
  "charset.unsupported": { code: "unsupported_charset", detail: "Send the body in UTF-8." },
};

function appErrorOf(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (error instanceof ZodError) {
    const issues = error.issues.map(({ path, message, code }) => ({ path: path.join("."), message, code }));
    const first = issues[0]?.message ?? "";
    return invalid(
      issues.length === 1 ? first : `${issues.length} entries need correcting. ${first}`,
      issues,
    );
  }
  if (error instanceof PhysicsDomainError) {
    return invalid(error.message, [{ path: error.quantity, message: error.message, code: "out_of_domain" }]);
  }
  if (isHttpError(error)) {
    const known = parserComplaints[error.type ?? ""];
    const title = STATUS_CODES[error.status] ?? "Not possible";
    const detail = known?.detail ?? "The request could not be read. Check its address and its body.";
    return new AppError(error.status, known?.code ?? "bad_request", title, detail);
  }
  return null;
}

const idOf = (req: Request): string => String(req.id);

/**
 * Answers every failure with a problem document (RFC 9457). What the person can act on says how; what nobody
 * foresaw is logged and answered blandly, with the id under which the log has it.
 */
export const errorHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) return next(error);
  const known = appErrorOf(error);
  if (!known) req.log.error({ err: error }, "a request failed");
  const failure =
    known ??
    new AppError(
      500,
      "internal",
      "Something went wrong here",
      `Nothing that you sent is at fault. Try again; if it happens again, report request ${idOf(req)}.`,
    );
  const problem: Problem = {
    type: `urn:tenuity:problem:${failure.code}`,
    title: failure.title,
    status: failure.status,
    detail: failure.message,
    code: failure.code,
    ...failure.members,
    requestId: idOf(req),
  };
  res.status(failure.status).type("application/problem+json").send(JSON.stringify(problem));
};
