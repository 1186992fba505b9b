import { z } from "zod";

/** One thing wrong with what was sent. */
export const problemIssue = z.object({
  /** Where: a path such as `document.cells.3.text`, or `line 12` of an imported file. */
  path: z.string(),
  message: z.string(),
  code: z.string(),
});
export type ProblemIssue = z.infer<typeof problemIssue>;

/** Answer to a request that failed: a problem document (RFC 9457), `application/problem+json`. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  /** What is wrong and what to do, for the person. */
  detail: z.string(),
  /** Stable, snake_case: `not_found`, `stale_revision`. */
  code: z.string(),
  issues: z.array(problemIssue).optional(),
  requestId: z.string(),
});
export type Problem = z.infer<typeof problem>;
