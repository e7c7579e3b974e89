import { createHash, randomBytes } from "node:crypto";

/** 256 random bits, safe in an address. Only its hash is stored. */
export const newSecret = (): string => randomBytes(32).toString("base64url");

/** SHA-256 is enough for what is random itself. */
export const secretHash = (secret: string): string => createHash("sha256").update(secret).digest("base64url");
