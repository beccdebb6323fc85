/** One kind of refusal: its HTTP status and the sentence that says what to do. */
interface ErrorEntry {
  status: number;
  title: string;
}

/**
 * Every error a route may answer with, by its stable code. The text is for people and may change;
 * the code and the status are the contract.
 */
export const ERRORS = {
  empty: { status: 400, title: 'The request has no body. Send JSON.' },
  json: { status: 400, title: 'The body is not JSON. Check it and send it again.' },
  shape: { status: 400, title: 'The request does not have the expected form.' },
  'dup-key': { status: 400, title: 'A member is named twice. Name each once.' },
  'unknown-field': { status: 400, title: 'The request has a member that is not known here. Leave it out.' },
  'dup-param': { status: 400, title: 'A parameter is given twice. Give each once.' },
  param: { status: 400, title: 'A parameter is not one of the allowed values.' },
  cursor: { status: 400, title: 'The cursor must look like <epoch>:<seq>.' },
  limit: { status: 400, title: 'The limit must be a whole number.' },
  'password-length': { status: 400, title: 'A password has 15 to 256 characters. A few words in a row do well.' },
  common: {
    status: 400,
    title:
      'This password would be guessed early: it is made of common words or of names that belong here. Choose another.',
  },
  device: { status: 400, title: 'Name the enrolled device in the X-Device header.' },
  signin: { status: 401, title: 'Sign in first. Nothing on your phone is lost.' },
  csrf: { status: 403, title: 'The request does not come from this application.' },
  role: { status: 403, title: 'Your role may not do this.' },
  'device-revoked': { status: 403, title: 'This device was withdrawn. Ask your coordinator.' },
  'lead-settles': {
    status: 403,
    title: 'The two readings differ too much for one reviewer. The lead biologist settles and locks this one.',
  },
  'wrong-password': { status: 403, title: 'This is not the password of the account. Check it and try again.' },
  blind: { status: 403, title: 'Submit your own reading first; then you can see this one.' },
  'not-found': { status: 404, title: 'There is nothing here.' },
  method: { status: 405, title: 'This address does not take that method.' },
  'epoch-mismatch': {
    status: 409,
    title: 'The office data was restored. Ask which operations it has, then send the rest.',
  },
  member: { status: 409, title: 'This person is a member of the team already.' },
  invited: { status: 409, title: 'This address has an invitation already. Send that one again.' },
  'last-coordinator': {
    status: 409,
    title: 'A team needs a coordinator. Make somebody else one first.',
  },
  revoked: { status: 409, title: 'This phone was withdrawn already.' },
  locked: { status: 409, title: 'The reading is locked. Amend it to make a new version.' },
  'not-locked': { status: 409, title: 'The reading is not locked, so it can be settled directly.' },
  'temperature-kept': { status: 409, title: 'This record is kept already. Nothing was stored twice.' },
  'temperature-removed': { status: 409, title: 'This record was taken out already.' },
  'temperature-file': { status: 422, title: 'The temperature file could not be read as it stands.' },
  settings: { status: 422, title: 'The settings cannot stand as they are. Nothing was stored.' },
  'settings-moved': {
    status: 409,
    title: 'A newer version of the settings was signed meanwhile. Start a new draft from it.',
  },
  'no-draft': { status: 409, title: 'There is no draft of the settings, so there is nothing to sign.' },
  claimed: { status: 409, title: 'Somebody else has taken on this second reading. Pick another from the list.' },
  'not-claimed': { status: 409, title: 'You have not taken on this second reading, so there is nothing to give back.' },
  'not-waiting': { status: 409, title: 'This visit does not wait for a second reading.' },
  'own-reading': { status: 409, title: 'You read this comb yourself. The second reading is for somebody else.' },
  'settled-meanwhile': {
    status: 409,
    title: 'Somebody else settled this reading while you did. Nothing of yours was stored; look at theirs first.',
  },
  unsettled: { status: 409, title: 'Not every difference between the two readings is settled yet.' },
  pick: { status: 409, title: 'The state is not the one that the reader you picked has seen. Look again.' },
  'not-primary': { status: 409, title: 'Another field reading of this visit was chosen. Settle that one.' },
  'link-closed': { status: 410, title: 'This link was used, was withdrawn or has run out. Ask for a new one.' },
  gone: { status: 410, title: 'That cursor is too old. Start again from the beginning.' },
  batch: { status: 413, title: 'Too many items in one request. Send fewer.' },
  body: { status: 413, title: 'The body is too large. Send less at a time.' },
  'content-type': { status: 415, title: 'Send application/json in UTF-8, not compressed.' },
  'client-too-old': {
    status: 426,
    title: 'This version of the app is too old to read. Update it; unsent work is kept.',
  },
  'too-many': { status: 429, title: 'Too many attempts. Wait a little, then try again.' },
  internal: { status: 500, title: 'Something failed on our side. Nothing was stored.' },
  busy: { status: 503, title: 'The office is busy. Nothing was stored; try again shortly.' },
} as const satisfies Record<string, ErrorEntry>;

/** The stable code of an error answer. */
export type ErrorCode = keyof typeof ERRORS;

/** An `application/problem+json` body. */
export interface Problem {
  type: string;
  title: string;
  status: number;
  code: ErrorCode;
  requestId: string;
}
