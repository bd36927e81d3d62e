import { defineError } from '../errors.ts';

export const requestInvalid = defineError('request.invalid', 400, 'Something in the request is not as it must be.');
export const requestNotFound = defineError('request.not_found', 404, 'There is nothing at this address.');
export const requestTooLarge = defineError('request.too_large', 413, 'That is larger than can be taken.');
export const unsupportedType = defineError('request.unsupported_type', 415, 'The body must be JSON.');
export const foreignOrigin = defineError('request.foreign_origin', 403, 'Changes are only taken from our own pages.');
export const preconditionRequired = defineError(
  'request.precondition_required',
  428,
  'Say which version you are changing (If-Match).',
);
export const versionConflict = defineError(
  'request.version_conflict',
  412,
  'Somebody else saved a change since you opened this.',
);
export const requestLimited = defineError('request.limited', 429, 'Too many tries. Wait a little and try again.');
export const serverUnready = defineError('server.unready', 503, 'The house is not ready; try again in a moment.');
export const serverFailed = defineError('server.failed', 500, 'Something broke on our side. It has been written down.');
export const signInFirst = defineError('access.sign_in', 401, 'Sign in first.');
export const roleMissing = defineError('access.role', 403, 'Your part in the house does not include this.');
export const ageUnconfirmed = defineError('age.unconfirmed', 403, 'Say that you are old enough first.');
