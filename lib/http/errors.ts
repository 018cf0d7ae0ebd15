/** What can go wrong, in one list. The code decides the HTTP status; nothing else does. */
export const STATUS_OF = {
  malformed: 400,
  unauthenticated: 401,
  forbidden: 403,
  "not-found": 404,
  "not-allowed": 405,
  "books-refuse": 409,
  conflict: 409,
  stale: 412,
  "too-large": 413,
  "unsupported-media": 415,
  input: 422,
  "key-reused": 422,
  "too-many": 429,
  internal: 500,
  unavailable: 503,
} as const;

export type ErrorCode = keyof typeof STATUS_OF;

const TITLE_OF: Record<ErrorCode, string> = {
  malformed: "The request cannot be read",
  unauthenticated: "Sign in first",
  forbidden: "Your role does not allow this",
  "not-found": "Not found",
  "not-allowed": "Not allowed here",
  "books-refuse": "The books say no",
  conflict: "It is already so",
  stale: "Somebody changed it first",
  "too-large": "Too large",
  "unsupported-media": "Send JSON",
  input: "There is a problem",
  "key-reused": "This key was used for something else",
  "too-many": "Too many tries",
  internal: "Something broke on our side",
  unavailable: "The database does not answer",
};

/** One wrong field: where it is (`items.0.count`) and what to do about it. */
export type FieldError = { path: string; message: string };

/**
 * The one error that use cases throw. `detail` is for the person: what is wrong and what to do. `cause` is for the log and is never shown.
 */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly detail: string;
  readonly errors: FieldError[];
  /** Seconds to wait, with `too-many`. */
  readonly retryAfter: number | null;
  /** The thing as it is now, with `stale`. */
  readonly current: unknown;

  constructor(code: ErrorCode, detail: string, more: { errors?: FieldError[]; cause?: unknown; retryAfter?: number; current?: unknown } = {}) {
    super(`${code}: ${detail}`, { cause: more.cause });
    this.name = "AppError";
    this.code = code;
    this.detail = detail;
    this.errors = more.errors ?? [];
    this.retryAfter = more.retryAfter ?? null;
    this.current = more.current;
  }
}

/** Missing and not-yours answer alike, so that nobody learns what other outfits have. */
export const notFound = (thing: string): AppError => new AppError("not-found", `There is no such ${thing} here.`);

/** One field is wrong. */
export const fieldError = (path: string, message: string): AppError => new AppError("input", message, { errors: [{ path, message }] });

/** An RFC 9457 problem document. */
export type Problem = { type: string; title: string; status: number; detail: string; errors?: FieldError[]; current?: unknown; requestId?: string };

/** The problem document of an error. Anything but an AppError is our bug: it says nothing of its insides, only the id that the log has. */
export function problemOf(error: unknown, requestId: string): Problem {
  const known = error instanceof AppError ? error : new AppError("internal", `Nothing was saved. Try again; if it stays, report number ${requestId}.`);
  return {
    type: `urn:curbweight:problem:${known.code}`,
    title: TITLE_OF[known.code],
    status: STATUS_OF[known.code],
    detail: known.detail,
    ...(known.errors.length > 0 ? { errors: known.errors } : {}),
    ...(known.current === undefined ? {} : { current: known.current }),
    ...(STATUS_OF[known.code] >= 500 ? { requestId } : {}),
  };
}
