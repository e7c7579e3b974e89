import { createHash, randomBytes } from "node:crypto";
import { env } from "@/lib/env";

/** 256 random bits: who has the address may read the calendar, and nobody can guess it. */
export const newToken = (): string => randomBytes(32).toString("base64url");

export const isToken = (text: string): boolean => /^[\w-]{43}$/.test(text);

/** What is stored. A plain hash does for a secret that is random: there is nothing to guess it by. */
export const hashOf = (token: string): string => createHash("sha256").update(token).digest("base64url");

export const addressOf = (token: string): string => `${env().APP_URL}/feeds/${token}/calendar.ics`;
