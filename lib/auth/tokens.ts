import "server-only";
import { createHash, randomBytes } from "node:crypto";

/** SHA-256 in hexadecimal: how secrets that carry their own randomness are stored. */
export const hashToken = (token: string): string => createHash("sha256").update(token).digest("hex");

/** A fresh secret of 256 random bits, safe in a URL, with a prefix that says what it is. */
export const makeToken = (prefix: string): string => `${prefix}_${randomBytes(32).toString("base64url")}`;
