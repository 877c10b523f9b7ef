/**
 * The closed set of expected errors. They reach the person in plain words as application/problem+json;
 * everything else is logged with the request's id and answered blandly.
 */
export class ExpectedError extends Error {
  constructor(
    readonly status: number,
    /** Stable word, last part of the problem's `type`. */
    readonly code: string,
    /** Short title of the kind of problem. */
    readonly title: string,
    /** What happened, what was kept, what to do. */
    detail: string,
    /** More members of the problem object, e.g. `errors` per field. */
    readonly extra: Record<string, unknown> = {},
    readonly headers: Record<string, string> = {},
  ) {
    super(detail);
    this.name = 'ExpectedError';
  }
}

export const unauthenticated = (detail = 'Sign in, or send a valid token.') =>
  new ExpectedError(401, 'unauthenticated', 'Not signed in', detail, {}, { 'WWW-Authenticate': 'Bearer' });

export const forbidden = (detail: string) => new ExpectedError(403, 'forbidden', 'Not allowed', detail);

/** Also the answer for what a person may not see: it does not exist for them. */
export const notFound = (detail = 'There is nothing here, or you were not given access to it.') => new ExpectedError(404, 'not-found', 'Not found', detail);

export const conflict = (detail: string, extra: Record<string, unknown> = {}) => new ExpectedError(409, 'conflict', 'Conflict', detail, extra);

export const tooLarge = (detail: string) => new ExpectedError(413, 'too-large', 'Too large', detail);

export const unsupported = (detail: string) => new ExpectedError(415, 'unsupported-media-type', 'Unsupported media type', detail);

/** `errors` maps field paths to messages. */
export const invalid = (detail: string, errors: Record<string, string> = {}) => new ExpectedError(422, 'invalid', 'Invalid input', detail, { errors });

export const tooMany = (detail: string, retryAfterSeconds: number) =>
  new ExpectedError(429, 'too-many-requests', 'Too many requests', detail, {}, { 'Retry-After': String(retryAfterSeconds) });
