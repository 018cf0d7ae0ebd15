import type { Role } from "./permissions";

/** The outfit a request is about. */
export type Outfit = {
  id: string;
  slug: string;
  name: string;
  place: string | null;
  country: string;
  currency: string;
  /** Digits after the decimal point of the currency. */
  exponent: number;
  weightUnit: "lb" | "kg";
  timeZone: string;
  staleAfterDays: number;
  hidesMoney: boolean;
  version: number;
};

/** Who acts. An API key acts in the name of the member who made it, with the key's own role. */
export type Actor = { memberId: string; userId: string; name: string; role: Role; apiKeyId: string | null };

/** Everything a use case needs to know about the request, and nothing of HTTP. */
export type Context = {
  outfit: Outfit;
  actor: Actor;
  requestId: string;
  now: Date;
  /** Today in the outfit's time zone. */
  today: string;
  /** Set when the request carries an Idempotency-Key. */
  idempotency: { keyHash: string; fingerprint: string } | null;
  /** The version the caller changed, from If-Match. */
  ifMatch: number | null;
  /** Raised by `transact` when the answer is the stored one of an earlier request. */
  replayed: boolean;
};
