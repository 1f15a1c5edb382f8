/**
 * Every error code that the API answers with, its HTTP status and its words for the person who asked.
 * A code never changes its meaning; client and scripts decide by the code, never by the words.
 */
export const errorCodes = {
  // The request itself
  'invalid-request': { status: 400, title: 'Some of what was sent cannot be used.' },
  'malformed-json': { status: 400, title: 'The body is not valid JSON.' },
  'body-too-deep': { status: 400, title: 'The body is nested too deeply.' },
  'malformed-address': { status: 400, title: 'The address of the request cannot be read.' },
  'body-too-large': { status: 413, title: 'The body is larger than is taken here.' },
  'unsupported-media-type': { status: 415, title: 'Send the body as application/json.' },
  'not-found': { status: 404, title: 'There is nothing at this address.' },
  'method-not-allowed': { status: 405, title: 'This address does not take that method.' },
  'too-many-requests': { status: 429, title: 'Too many requests. Wait a little and try again.' },
  'version-required': { status: 428, title: 'Say which version is changed, with If-Match.' },
  'version-conflict': { status: 412, title: 'Somebody else changed this in the meantime. Load it again.' },
  conflict: { status: 409, title: 'This does not fit the present state.' },
  // Who asks
  'sign-in-required': { status: 401, title: 'Sign in first.' },
  'token-invalid': { status: 401, title: 'The access token is not valid.' },
  'token-expired': { status: 401, title: 'The access token has expired.' },
  'session-ended': { status: 401, title: 'This session has ended. Sign in again.' },
  'sign-in-failed': { status: 401, title: 'Address and password do not match an account.' },
  'email-not-confirmed': { status: 403, title: 'Confirm the e-mail address first. The link is in your mail.' },
  'role-required': { status: 403, title: 'Your role does not allow this.' },
  'foreign-origin': { status: 403, title: 'The request came from another site.' },
  'too-many-attempts': { status: 429, title: 'Too many attempts. Wait before the next one.' },
  'link-invalid': { status: 410, title: 'This link was used already or has expired. Ask for a new one.' },
  'password-wrong': { status: 422, title: 'The present password is not right.' },
  'request-open': { status: 409, title: 'A request of yours is still waiting for an answer.' },
  // Layouts
  'layout-invalid': { status: 422, title: 'The layout has errors. Put them right and send it again.' },
  'layout-retired': { status: 410, title: 'The layout of this board was withdrawn.' },
  'own-version': { status: 403, title: 'Nobody decides on a version of his own. Another moderator must.' },
  // The server
  'not-ready': { status: 503, title: 'The server is not ready. Try again in a moment.' },
  internal: { status: 500, title: 'Something went wrong on the server. It has been noted.' },
} as const satisfies Record<string, { status: number; title: string }>;

export type ErrorCode = keyof typeof errorCodes;
