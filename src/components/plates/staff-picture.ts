import type { Picture, PlateView } from '@shared/contracts/plates.ts';

/** A plate as a picture at the staff's address, in every size that is prepared. */
export function staffPicture({ id, alt, caption, credit, width, height, renditions }: PlateView): Picture {
  return {
    alt,
    caption,
    credit,
    width,
    height,
    sources: renditions.map((rendition) => ({
      format: rendition.format,
      width: rendition.width,
      href: `/api/plates/${id}/${rendition.size}.${rendition.format}`,
    })),
  };
}
