/** The one table of problems: every error that leaves the service has a row here, and the table is the type.
 *  meaning: what has happened; remedy: what the caller can do. Both are printed on /docs/problems/<slug>. */
export const PROBLEMS = {
  'malformed-body': {
    status: 400,
    title: 'The body does not parse',
    meaning: 'The body is not what its content type says: broken JSON, JSON that is not UTF-8, broken multipart, a table that is no CSV, or bytes that are no whole number of records.',
    remedy: 'Check the body with a JSON or multipart library before sending; the detail says where reading stopped, or how many bytes a record has.',
  },
  'sign-in-required': {
    status: 401,
    title: 'Sign in or send a key',
    meaning: 'The request carries neither a session nor an Authorization field of the form "Bearer <key>".',
    remedy: 'Send a key of the team in the Authorization field, or sign in with the browser.',
  },
  'session-ended': {
    status: 401,
    title: 'The session has ended',
    meaning: 'The session was signed out, ended from another place, or has run out.',
    remedy: 'Sign in again. Nothing that was stored is lost.',
  },
  'key-mistyped': {
    status: 401,
    title: 'The key is mistyped',
    meaning: 'The key is not of the form elb_…, or its last six characters do not match the rest: a character was lost or changed on the way.',
    remedy: 'Copy the key again from where it is kept; it has 66 characters.',
  },
  'key-unknown': {
    status: 401,
    title: 'No such key',
    meaning: 'The key is well formed, but this installation has never issued it.',
    remedy: 'Check that the key belongs to this installation, or ask an administrator of the team for a new one.',
  },
  'key-expired': {
    status: 401,
    title: 'The key has expired',
    meaning: 'The date set for this key when it was made has passed.',
    remedy: 'Ask an administrator of the team for a new key.',
  },
  'key-revoked': {
    status: 401,
    title: 'The key was revoked',
    meaning: 'An administrator of the team has revoked this key.',
    remedy: 'Ask an administrator of the team for a new key.',
  },
  'scope-missing': {
    status: 403,
    title: 'The key lacks a scope',
    meaning: 'The key is valid and belongs to this team, but was not given the scope that this operation asks for.',
    remedy: 'Ask an administrator for a key with the scope named in the detail.',
  },
  'role-missing': {
    status: 403,
    title: 'Your role does not allow this',
    meaning: 'You are a member of this team, but the act belongs to a role that you do not have.',
    remedy: 'Ask someone with the role named in the detail, or an administrator to change yours.',
  },
  'session-only': {
    status: 403,
    title: 'Only a signed-in person may do this',
    meaning: 'Keys cannot release revisions or manage keys: these acts belong to a person.',
    remedy: 'Sign in with the browser.',
  },
  'origin-refused': {
    status: 403,
    title: 'The request came from another site',
    meaning: 'A state-changing request with a session cookie must carry the Origin of this installation.',
    remedy: 'Use the pages of this installation, or send a key instead of the cookie.',
  },
  'not-found': {
    status: 404,
    title: 'Nothing at this address',
    meaning: 'The service has no operation at this path.',
    remedy: 'Compare the path with the reference.',
  },
  'team-not-found': {
    status: 404,
    title: 'No such team',
    meaning: 'No team of this name is open to you.',
    remedy: 'Check the name in the path, and that your key or account belongs to that team.',
  },
  'model-not-found': {
    status: 404,
    title: 'No such model',
    meaning: 'No model of this team has this name.',
    remedy: 'Look the name up in the register.',
  },
  'revision-not-found': {
    status: 404,
    title: 'No such revision',
    meaning: 'The model has no revision of this number.',
    remedy: 'List the revisions of the model; they count from 1.',
  },
  'nothing-released': {
    status: 404,
    title: 'Nothing is released',
    meaning: 'The word "released" was used in place of a revision number, but no revision of the model is in force.',
    remedy: 'Name a revision by its number, or have one released.',
  },
  'key-not-found': {
    status: 404,
    title: 'No such key',
    meaning: 'No key of this team has this id.',
    remedy: 'List the keys of the team.',
  },
  'reference-poses-not-found': {
    status: 404,
    title: 'No such reference poses',
    meaning: 'The revision has no set of reference poses of this number.',
    remedy: 'List the reference poses of the revision; they count from 1.',
  },
  'mesh-not-found': {
    status: 404,
    title: 'No such mesh',
    meaning: 'No mesh or texture of this path came with the revision.',
    remedy: 'Read the revision: its archive.files lists the paths. Encode each part of a path by itself.',
  },
  'method-not-allowed': {
    status: 405,
    title: 'Not with this method',
    meaning: 'The path exists, but not with this HTTP method. The Allow field lists the methods it has.',
    remedy: 'Use one of the methods in the Allow field.',
  },
  'not-acceptable': {
    status: 406,
    title: 'No answer in that format',
    meaning: 'The Accept field leaves out every format that this operation can answer in.',
    remedy: 'Accept the format named in the detail, or leave the field out.',
  },
  'unsupported-media-type': {
    status: 415,
    title: 'Not in this format',
    meaning: 'The Content-Type or Content-Encoding of the body is not one that this operation reads.',
    remedy: 'Send the content type named in the detail, without a content encoding.',
  },
  'too-large': {
    status: 413,
    title: 'The body is too large',
    meaning: 'The body is larger than this operation reads. Nothing was computed or stored.',
    remedy: 'Send less at once; the detail says how much is read.',
  },
  'answer-too-large': {
    status: 413,
    title: 'The answer would be too large',
    meaning: 'The answer was estimated at more than 64 MiB before computing, so nothing was computed.',
    remedy: 'Ask for fewer configurations at once, or name the fields that you need in "include".',
  },
  'invalid-request': {
    status: 422,
    title: 'The request is wrong',
    meaning: 'The request parses, but a value in it is missing, unknown, of the wrong kind or out of range. Each fault is listed with its place.',
    remedy: 'Mend the places listed under "errors".',
  },
  'length-mismatch': {
    status: 422,
    title: 'Lengths do not match',
    meaning: 'A list does not have as many entries as the chain has independent joints, or as there are configurations.',
    remedy: 'Compare with chain.joints of the revision; each place is listed under "errors".',
  },
  'chain-not-found': {
    status: 422,
    title: 'No such chain',
    meaning: 'The base or tip named in "chain" is not a link of this revision.',
    remedy: 'Use the links listed by the revision, letter by letter.',
  },
  'chain-not-computable': {
    status: 422,
    title: 'The chain cannot be computed',
    meaning: 'A floating or planar joint stands between base and tip; such joints are imported but not computed.',
    remedy: 'Choose a base and a tip on the same side of that joint.',
  },
  'link-not-determined': {
    status: 422,
    title: 'The link is not determined by this chain',
    meaning: 'The link named in "links" also depends on a joint that is not in chain.joints, so its pose does not follow from the configuration.',
    remedy: 'Leave the link out, or choose a chain that contains the joint.',
  },
  'budget-exceeded': {
    status: 422,
    title: 'It takes too long',
    meaning: 'The request needed more than 10 seconds of computing and was given up. Nothing of it is answered.',
    remedy: 'Send fewer targets at once, give seeds near the answers, allow fewer attempts, or relax the tolerances.',
  },
  'import-refused': {
    status: 422,
    title: 'The file cannot be imported',
    meaning: 'The importer found at least one error. Everything it has to say is listed under "findings"; nothing was stored.',
    remedy: 'Mend the file as each finding says and send it again.',
  },
  'if-match-required': {
    status: 428,
    title: 'Say which state you are changing',
    meaning: 'A change of a stored thing must carry If-Match with the ETag that you last read, so that two people do not overwrite each other.',
    remedy: 'Read the thing, then send its ETag in If-Match.',
  },
  stale: {
    status: 412,
    title: 'It has changed since you read it',
    meaning: 'The ETag in If-Match is not the current one: somebody changed the thing meanwhile. Nothing was changed by this request.',
    remedy: 'Read it again, look at what changed, and repeat the change if it still applies.',
  },
  'fingerprint-mismatch': {
    status: 412,
    title: 'Not the model you asked for',
    meaning: 'If-Match insists on a fingerprint, and the revision at this address has another one. Nothing was computed.',
    remedy: 'Hold. Find out why the model changed before you accept the new fingerprint, which is in the Model-Fingerprint field.',
  },
  'slug-taken': {
    status: 409,
    title: 'The name is taken',
    meaning: 'Another model of this team already has this slug.',
    remedy: 'Choose another slug, or leave it out to have one derived.',
  },
  'same-content': {
    status: 409,
    title: 'The same kinematics is already there',
    meaning: 'A revision of this model has the same fingerprint: the two files compute the same numbers.',
    remedy: 'Use the revision named under "twin", or send allowSame=true to store the file all the same.',
  },
  'transition-refused': {
    status: 409,
    title: 'Not from this status',
    meaning: 'The revision cannot go from its present status to the one asked for.',
    remedy: 'Read the revision again; the detail says which status it has.',
  },
  'not-released': {
    status: 409,
    title: 'It was never released',
    meaning: 'Check vectors belong to revisions that were released, and this one never was.',
    remedy: 'Have the revision released, or name one that was. Until then ask for poses and Jacobians at configurations of your own.',
  },
  'evidence-missing': {
    status: 409,
    title: 'Evidence is missing',
    meaning: 'This team releases a revision only when its newest reference poses pass, and they do not, or there are none.',
    remedy: 'Store measured reference poses with the revision. Where they fail, find out whether the model or the measurement is wrong.',
  },
  'four-eyes': {
    status: 409,
    title: 'A second pair of eyes is needed',
    meaning: 'This team demands that the person who releases a revision neither imported nor submitted it.',
    remedy: 'Ask another approver.',
  },
  'internal-error': {
    status: 500,
    title: 'Something failed here',
    meaning: 'The service met a fault of its own. It is logged under the request id. Nothing was half stored.',
    remedy: 'Try once more; if it stays, send the request id to whoever runs this installation.',
  },
  'file-unavailable': {
    status: 503,
    title: 'The file cannot be had just now',
    meaning: 'The file is recorded, but the file storage does not hold it, cannot be reached, or holds other bytes than were stored.',
    remedy: 'Try again shortly. If it stays, tell whoever runs this installation: files may be missing from a restored backup.',
  },
  'not-ready': {
    status: 503,
    title: 'Not ready',
    meaning: 'The database cannot be reached or is still being prepared.',
    remedy: 'Try again shortly. A gateway holds until then.',
  },
} as const satisfies Record<string, { status: number; title: string; meaning: string; remedy: string }>

export type ProblemCode = keyof typeof PROBLEMS

/** One fault in a request. pointer: a JSON Pointer into the body; /query/… and /form/… for the other parts. */
export interface Fault {
  readonly pointer: string
  readonly detail: string
}

/** What a failure carries beyond its code. `members` become extension members of the problem (RFC 9457 section 3.2). */
export interface ProblemMore {
  readonly errors?: readonly Fault[]
  readonly members?: Readonly<Record<string, unknown>>
  readonly headers?: Readonly<Record<string, string>>
}

/** A failure with a row in the table; the edge turns it into application/problem+json. */
export class Problem extends Error {
  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly more: ProblemMore = {},
  ) {
    super(`${code}: ${detail}`)
    this.name = 'Problem'
  }
}

/** Fails with a row of the table. detail: a sentence a person can act on; the row's meaning when left out. */
export function fail(code: ProblemCode, detail?: string, more?: ProblemMore): never {
  throw new Problem(code, detail ?? PROBLEMS[code].meaning, more)
}
