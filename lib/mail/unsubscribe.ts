import { createHmac, timingSafeEqual } from "node:crypto";
import { z } from "zod";
import type { Tx } from "@/db/client";
import { updateMailChoice } from "@/db/queries/mails";
import { env } from "@/lib/env";

/** Part of what is signed: a signature made for something else is none here. */
const PURPOSE = "unsubscribe-changes.1";

const signatureOf = (userId: string): Buffer =>
  createHmac("sha256", env().NEXTAUTH_SECRET).update(`${PURPOSE}:${userId}`).digest();

/**
 * Names a person and the list, and cannot be forged (RFC 8058 section 3.1): 16 bytes of user id, 32 of HMAC. It has no
 * date, because a mail may be opened years later; it can do nothing but stop mail.
 */
export function unsubscribeToken(userId: string): string {
  const id = Buffer.from(userId.replaceAll("-", ""), "hex");
  return Buffer.concat([id, signatureOf(userId)]).toString("base64url");
}

/** The person that a token names, or null where it is not ours. */
export function readUnsubscribeToken(token: string): string | null {
  if (!/^[\w-]{64}$/.test(token)) return null;
  const bytes = Buffer.from(token, "base64url");
  const hex = bytes.subarray(0, 16).toString("hex");
  const userId = hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, "$1-$2-$3-$4-$5");
  const signature = bytes.subarray(16);
  if (signature.length !== 32 || !timingSafeEqual(signature, signatureOf(userId))) return null;
  return z.guid().safeParse(userId).success ? userId : null;
}

/** Stops mail about changes. Repeating it is harmless. False where the token names nobody. */
export async function unsubscribe(tx: Tx, token: string): Promise<boolean> {
  const userId = readUnsubscribeToken(token);
  return userId !== null && (await updateMailChoice(tx, userId, "none"));
}
