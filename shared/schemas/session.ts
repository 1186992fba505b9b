import { z } from "zod";

/** Longest accepted secret: enough for any phrase, short enough to hash without harm. */
export const passwordLimits = { shortest: 12, longest: 200 } as const;

export const signInBody = z.object({
  email: z.string().max(320),
  password: z.string().max(passwordLimits.longest),
});
export type SignInBody = z.infer<typeof signInBody>;

export const demoSignInBody = z.object({ email: z.string().max(320) });
export type DemoSignInBody = z.infer<typeof demoSignInBody>;

/** The person signed in. */
export const account = z.object({ id: z.string(), name: z.string(), email: z.string() });
export type Account = z.infer<typeof account>;

/** A demonstration account that one may look round as; `part` says what it is: "lead". */
export const demoAccount = z.object({ email: z.string(), name: z.string(), part: z.string() });
export type DemoAccount = z.infer<typeof demoAccount>;

export const sessionResponse = z.object({
  user: account.nullable(),
  /** null where the demonstration is off. */
  demo: z.array(demoAccount).nullable(),
});
export type SessionResponse = z.infer<typeof sessionResponse>;
