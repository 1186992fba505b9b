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
    LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "trace", "silent"]).default("info"),
  })
  .refine((env) => !(env.TENUITY_DEMO === "on" && env.NODE_ENV === "production"), {
    path: ["TENUITY_DEMO"],
    message:
      "on lets anyone in without a password and is refused together with NODE_ENV=production; unset one of the two",
  });

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
    logLevel: env.LOG_LEVEL,
  };
}
