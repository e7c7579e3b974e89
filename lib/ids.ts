import { createHash, randomBytes } from "node:crypto";

/** A secret for an address: 256 random bits. Only its hash is stored. */
export const newSecret = (): string => randomBytes(32).toString("base64url");

/** What is stored of a secret. A plain hash does for what is random: there is nothing to guess it by. */
export const secretHash = (secret: string): string => createHash("sha256").update(secret).digest("base64url");
