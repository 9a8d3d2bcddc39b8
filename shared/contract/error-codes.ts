/**
 * Every stable error code the API can answer with, and the HTTP status it travels under.
 * The client branches on the code, never on the sentence.
 */
export const ERROR_STATUS = {
  invalid_request: 400,
  malformed_json: 400,
  not_signed_in: 401,
  wrong_credentials: 401,
  session_expired: 401,
  forbidden: 403,
  wrong_origin: 403,
  not_found: 404,
  method_not_allowed: 405,
  conflict: 409,
  ranking_changed: 409,
  swap_already_taken: 409,
  already_closed: 409,
  reset_link_invalid: 410,
  body_too_large: 413,
  unsupported_media_type: 415,
  red_flag: 422,
  mechanics_invalid: 422,
  profile_incomplete: 422,
  not_a_swap: 422,
  too_many_requests: 429,
  internal: 500,
  unavailable: 503,
} as const

export type ErrorCode = keyof typeof ERROR_STATUS
export const ERROR_CODES = Object.keys(ERROR_STATUS) as [ErrorCode, ...ErrorCode[]]
