import { defineError } from '../errors.ts';

export const plateNotFound = defineError('plates.not_found', 404, 'There is no such plate.');
export const plateInUse = defineError('plates.in_use', 409, 'The plate stands in a recipe or on a cover.');
export const plateEmpty = defineError('plates.empty', 422, 'The file is empty.');
export const notAPicture = defineError(
  'plates.not_a_picture',
  422,
  'The file is not a picture, whatever its name says.',
);
export const unsupportedFormat = defineError(
  'plates.unsupported_format',
  422,
  'This kind of picture cannot be taken. Save it as JPEG, PNG, WebP, AVIF or TIFF.',
);
export const tooManyPixels = defineError('plates.too_many_pixels', 422, 'The picture has more than 100 megapixels.');
export const plateUnreadable = defineError('plates.unreadable', 422, 'The picture is damaged and cannot be read.');
export const plateTooLarge = defineError('plates.too_large', 413, 'A picture may have up to 60 MB.');
