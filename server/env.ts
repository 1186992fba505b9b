import { z } from "zod";

const origin = z
  .url("not a web address; write it as https://tenuity.example")
  .transform((address) => new URL(address).origin);

const environment = z
  .object({
    NODE_ENV: z.string().default("development"),
    HOST: z.string().optional(),
    PORT: z.coerce.number("not a number").int().min(0).max(65_535).default(4710),
    TENUITY_DATA: z.string().min(1).default("data"),
    DATABASE_URL: z.string().min(1).optional(),
    TENUITY_DEMO: z.enum(["on", "off"], "neither on nor off").default("off"),
    TENUITY_ORIGIN: origin.optional(),
    TENUITY_PROXIES: z.coerce.number("not a number").int().min(0).max(10).default(0),
    TENUITY_SMTP_HOST: z.string().min(1).optional(),
    TENUITY_SMTP_PORT: z.coerce.number("not a number").int().min(1).max(65_535).default(587),
    TENUITY_SMTP_USER: z.string().min(1).optional(),
    TENUITY_SMTP_PASSWORD: z.string().min(1).optional(),
    TENUITY_SMTP_FROM: z.string().min(3).max(320).optional(),
    LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "trace", "silent"]).default("info"),
  })
  .refine((env) => !(env.TENUITY_DEMO === "on" && env.NODE_ENV === "production"), {
    path: ["TENUITY_DEMO"],
    message:
      "on lets anyone in without a password and is refused together with NODE_ENV=production; unset one of the two",
  })
  .refine((env) => env.TENUITY_SMTP_HOST === undefined || env.TENUITY_SMTP_FROM !== undefined, {
    path: ["TENUITY_SMTP_FROM"],
    message: "needed with TENUITY_SMTP_HOST: the address that letters come from",
  })
  .refine((env) => (env.TENUITY_SMTP_USER === undefined) === (env.TENUITY_SMTP_PASSWORD === undefined), {
    path: ["TENUITY_SMTP_PASSWORD"],
    message: "set it together with TENUITY_SMTP_USER, or neither",
  });

/** A mail server to send by. Port 465 is encrypted from the start; any other is upgraded where the server offers it. */
export interface SmtpSettings {
  host: string;
  port: number;
  user: string | undefined;
  password: string | undefined;
  from: string;
}

export interface Env {
  /** Address to listen on; every one where it is left out. */
  host: string | undefined;
  port: number;
  dataFolder: string;
  /** A PostgreSQL server to use instead of the embedded one. */
  databaseUrl: string | undefined;
  /** Demonstration people, and signing in as them without a password. */
  demo: boolean;
  /** Public origin, where it is not the address that requests name; https makes cookies secure. */
  origin: string | undefined;
  /** Proxies in front of the server whose word on the caller's address is taken. */
  proxies: number;
  /** null: letters are kept in the database and go nowhere. */
  smtp: SmtpSettings | null;
  logLevel: string;
}

/** The settings, or an error that names every one that is wrong. Empty variables count as left out. */
export function readEnv(variables: Record<string, string | undefined>): Env {
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ""));
  const parsed = environment.safeParse(given);
  if (!parsed.success) {
    const complaints = parsed.error.issues.map(({ path, message }) => `  ${path.join(".")}: ${message}`);
    throw new Error(`The settings cannot be used:\n${complaints.join("\n")}`);
  }
  const env = parsed.data;
  return {
    host: env.HOST,
    port: env.PORT,
    dataFolder: env.TENUITY_DATA,
    databaseUrl: env.DATABASE_URL,
    demo: env.TENUITY_DEMO === "on",
    origin: env.TENUITY_ORIGIN,
    proxies: env.TENUITY_PROXIES,
    smtp: env.TENUITY_SMTP_HOST
      ? {
          host: env.TENUITY_SMTP_HOST,
          port: env.TENUITY_SMTP_PORT,
          user: env.TENUITY_SMTP_USER,
          password: env.TENUITY_SMTP_PASSWORD,
          from: env.TENUITY_SMTP_FROM!,
        }
      : null,
    logLevel: env.LOG_LEVEL,
  };
}

/** Where the server is reached by links: its public origin, or this machine. */
export const linkOriginOf = ({ origin, port }: Pick<Env, "origin" | "port">): string =>
  origin ?? `http://localhost:${port}`;
