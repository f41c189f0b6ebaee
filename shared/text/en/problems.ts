/** The problem catalogue: what each code means, and what to do about it. */
export const problems = {
  malformed_json: {
    status: 400,
    title: 'The body is not JSON',
    cause: 'The body could not be read as a JSON object.',
    cure: 'Send one JSON object, in UTF-8, with double quotes around names and text and no trailing comma.',
  },
  malformed_request: {
    status: 400,
    title: 'The request can’t be read',
    cause:
      'A query name stands twice, the address has a bad percent-encoding, or a key was put into the address.',
    cure: 'Give each query name once, encode it as UTF-8, and send the key in the Authorization header only.',
  },
  key_missing: {
    status: 401,
    title: 'A key is needed',
    cause: 'The call carries no key.',
    cure: 'Send the header “Authorization: Bearer <your key>”. Keys are made in the console under Keys.',
  },
  key_invalid: {
    status: 401,
    title: 'This key is not known',
    cause: 'The key has a typing error (its checksum does not fit), or no such key exists.',
    cure: 'Copy the key again, whole, without spaces. A key that is lost can’t be shown again: make a new one.',
  },
  key_expired: {
    status: 401,
    title: 'This key has expired',
    cause: 'The key’s expiry lies in the past, or its grace after a rotation is over.',
    cure: 'Make or rotate a key in the console and use the new one.',
  },
  key_revoked: {
    status: 401,
    title: 'This key was revoked',
    cause: 'The key’s owner or an administrator revoked it; that is final.',
    cure: 'Make a new key in the console.',
  },
  origin_not_allowed: {
    status: 403,
    title: 'This site is not on the widget’s list',
    cause: 'A page key was used from a site that its widget does not list, or from outside a browser page.',
    cure: 'Add the site to the widget’s list in the console, exactly as the browser’s address bar shows it.',
  },
  server_key_in_browser: {
    status: 403,
    title: 'A server key must not be used in a browser',
    cause: 'The call came from a page of another site. Anyone who reads that page could copy the key.',
    cure: 'Call from your server, or build a widget, which has a page key. Revoke this key if the page was public.',
  },
  scope_missing: {
    status: 403,
    title: 'This key may not call that',
    cause: 'The key’s scopes do not include this group of calculators.',
    cure: 'Use another key, or make one with the scope that the detail names.',
  },
  account_blocked: {
    status: 403,
    title: 'This account is blocked',
    cause: 'An administrator blocked the account that the key belongs to.',
    cure: 'Write to the service’s contact address.',
  },
  not_found: {
    status: 404,
    title: 'There is nothing here',
    cause: 'No resource stands at this address, or you may not know of it.',
    cure: 'Compare the path with the list at /v1/calculators or with the reference at /docs.',
  },
  method_not_allowed: {
    status: 405,
    title: 'This method is not offered here',
    cause: 'The address exists, but not for this method.',
    cure: 'Use one of the methods that the Allow header names. Lists and objects need POST.',
  },
  too_large: {
    status: 413,
    title: 'The body is too large',
    cause: 'The body is over the limit that the detail names.',
    cure: 'Send less at a time: 256 KiB for a call, 2 MiB for a batch, 25 MiB for a frame.',
  },
  unsupported_media_type: {
    status: 415,
    title: 'This kind of body is not taken',
    cause: 'The Content-Type is not application/json, or the body is compressed.',
    cure: 'Send “Content-Type: application/json” and the body as it is.',
  },
  invalid_input: {
    status: 422,
    title: 'The input can’t be computed',
    cause: 'A value is out of range or missing, a field is not known, or two fields contradict each other.',
    cure: 'Mend every fault in “errors”; each names its field by a JSON Pointer. Nothing was charged.',
  },
  rate_limited: {
    status: 429,
    title: 'Too many calls at once',
    cause: 'The account’s requests a second, with its burst, are used up.',
    cure: 'Wait for the seconds in Retry-After, then go on more slowly; put many calculations into one batch.',
  },
  quota_exhausted: {
    status: 429,
    title: 'The month’s units are used up',
    cause: 'The account’s plan has no units left in this calendar month (UTC), or fewer than the call costs.',
    cure: 'Wait for the first of the month, or ask for a larger plan in the console under Plan.',
  },
  key_cap_reached: {
    status: 429,
    title: 'This key’s own cap is reached',
    cause: 'The key has a monthly cap of its own, and the call would go over it.',
    cure: 'Raise the cap in the console, use another key, or wait for the first of the month (UTC).',
  },
  internal_error: {
    status: 500,
    title: 'Our fault',
    cause: 'Something failed on our side. It was logged with the request id, and nothing was charged.',
    cure: 'Try again; if it stays, write to us with the request id.',
  },
  unavailable: {
    status: 503,
    title: 'The service can’t count calls just now',
    cause: 'The database can’t be reached, so nothing is answered uncounted. Nothing was charged.',
    cure: 'Try again after the seconds in Retry-After.',
  },
} as const;
