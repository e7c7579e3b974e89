import { hash, verify } from "@node-rs/argon2";

/** argon2id (the library's default kind) with the least cost that OWASP's password storage cheat sheet gives for it. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** The same letters typed on another keyboard are the same password. */
const normal = (password: string): string => password.normalize("NFKC");

export const hashPassword = (password: string): Promise<string> => hash(normal(password), COST);

let standIn: Promise<string> | undefined;

/**
 * True where the password fits. Without a hash (nobody has that e-mail) it does the same work against a stand-in and is
 * false, so that the time taken tells nothing.
 */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  standIn ??= hashPassword("nobody has this password");
  const fits = await verify(passwordHash ?? (await standIn), normal(password)).catch(() => false);
  return passwordHash !== null && fits;
}
