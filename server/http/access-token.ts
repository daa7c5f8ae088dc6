/** What our access tokens say about themselves; a token that says otherwise is not ours. */
export const TOKEN_ISSUER = 'slantwise';
export const ACCESS_AUDIENCE = 'slantwise-session';
/** The one algorithm we sign and accept. */
export const TOKEN_ALGORITHM = 'HS256';
export const CLOCK_SKEW_SECONDS = 30;
