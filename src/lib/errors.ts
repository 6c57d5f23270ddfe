/** Errors that a caller may read. Everything else that is thrown is a defect: logged, and answered generically. */

export const errorStatus = {
  /** The body cannot be read: not JSON, not UTF-8. */
  MALFORMED: 400,
  UNAUTHENTICATED: 401,
  FORBIDDEN: 403,
  /** Also for what the asker may not know of. */
  NOT_FOUND: 404,
  METHOD_NOT_ALLOWED: 405,
  CONFLICT: 409,
  TOO_LARGE: 413,
  UNSUPPORTED_MEDIA_TYPE: 415,
  /** A field is missing, unknown, of the wrong kind or outside its range; the details name it. */
  INVALID_INPUT: 422,
  /** Each field is fine, but what they ask for together has no answer. */
  UNPROCESSABLE: 422,
  RATE_LIMITED: 429,
  INTERNAL: 500,
  UNAVAILABLE: 503,
} as const;

export type ErrorCode = keyof typeof errorStatus;

/** One bad field: `sample.porosity`, `temperatures_K.3`. The message says value and remedy. */
export interface FieldError {
  readonly path: string;
  readonly message: string;
}

export interface AppErrorDetails {
  readonly fields?: readonly FieldError[];
  /** Headers the answer must carry, such as `Allow`. */
  readonly headers?: Readonly<Record<string, string>>;
  readonly cause?: unknown;
}

/** What went wrong in a sentence for the caller, with a code that decides the HTTP status. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly fields: readonly FieldError[];
  readonly headers: Readonly<Record<string, string>>;

  constructor(code: ErrorCode, message: string, details: AppErrorDetails = {}) {
    super(message, details.cause === undefined ? undefined : { cause: details.cause });
    this.name = 'AppError';
    this.code = code;
    this.fields = details.fields ?? [];
    this.headers = details.headers ?? {};
  }

  get status(): number {
    return errorStatus[this.code];
  }
}
