import { z } from "zod";

const flag = z
  .enum(["0", "1"])
  .default("0")
  .transform((value) => value === "1");

const envSchema = z
  .object({
    NODE_ENV: z.enum(["development", "production", "test"]).default("development"),
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, error: "must be a postgres:// address" }),
    SMTP_URL: z.url({ protocol: /^smtps?$/, error: "must be an smtp:// or smtps:// address" }),
    /** Sender of every mail, as `Name <address>` or a bare address. */
    MAIL_FROM: z.string().includes("@"),
    /** Signs session tokens and single-use links. */
    NEXTAUTH_SECRET: z.string().min(32, "must have at least 32 characters"),
    /** Where people reach this server; next-auth reads it by this name. */
    NEXTAUTH_URL: z.url(),
    /** Same address, for links in mails and feeds, where it differs from the one next-auth serves. */
    APP_URL: z.url().optional(),
    /** Folder of the development mail catcher. Set: /outbox shows its mails. Unset: there is no /outbox. */
    BELLWARD_OUTBOX_DIR: z.string().min(1).optional(),
    /** Signs mails (DKIM) when all three are set; the key is PEM, its line breaks may be written as \n. */
    DKIM_DOMAIN: z.string().optional(),
    DKIM_SELECTOR: z.string().optional(),
    DKIM_KEY: z.string().optional(),
    /** Makes a production build obey BELLWARD_NOW; for browser tests. */
    BELLWARD_TEST: flag,
    BELLWARD_NOW: z.iso.datetime({ offset: true }).optional(),
    /** Requests per minute and address that the stateless planner answers; browser tests raise it. */
    PLAN_RATE_PER_MINUTE: z.coerce.number().int().positive().default(60),
  })
  .transform(({ APP_URL, NEXTAUTH_URL, ...rest }) => ({
    ...rest,
    NEXTAUTH_URL,
    /** Without a slash at its end. */
    APP_URL: (APP_URL ?? NEXTAUTH_URL).replace(/\/+$/, ""),
  }));

export type Env = z.output<typeof envSchema>;

/** Reads settings from `source`; throws one message that names every setting that is missing or wrong. */
export function parseEnv(source: Readonly<Record<string, string | undefined>>): Env {
  // An empty value in a .env file means "not set".
  const given = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ""));
  const parsed = envSchema.safeParse(given);
  if (parsed.success) return parsed.data;
  const wrong = parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
  throw new Error(`Settings are missing or wrong (see .env.example): ${wrong.join("; ")}`);
}

let read: Env | undefined;

/** The settings of this process, read at first use: a build needs none of them. */
export function env(): Env {
  read ??= parseEnv(process.env);
  return read;
}
