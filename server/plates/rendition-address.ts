import { z } from 'zod';
import type { BoundPlate } from '../../shared/contracts/editions.ts';
import { RENDITION_FORMATS, type Picture, type Rendition } from '../../shared/contracts/plates.ts';

const SIZES = ['small', 'medium', 'large'] as const;

/** The last part of a plate's address: size and format, e.g. `small.avif`. */
export const renditionName = z
  .string()
  .regex(new RegExp(`^(${SIZES.join('|')})\\.(${RENDITION_FORMATS.join('|')})$`), 'There is no such size of a plate.')
  .transform((name) => {
    const [size, format] = name.split('.') as [Rendition['size'], Rendition['format']];
    return { size, format };
  });
export type RenditionName = z.output<typeof renditionName>;

export function findRendition(
  renditions: readonly Rendition[],
  { size, format }: RenditionName,
): Rendition | undefined {
  return renditions.find((rendition) => rendition.size === size && rendition.format === format);
}

/** A plate as a page shows it, with every size below `base`, or only the small ones. */
export function toPicture(plate: BoundPlate, base: string, sizes: 'all' | 'small'): Picture {
  const shown = plate.renditions.filter((rendition) => sizes === 'all' || rendition.size === 'small');
  return {
    alt: plate.alt,
    caption: plate.caption,
    credit: plate.credit,
    width: plate.width,
    height: plate.height,
    sources: shown.map(({ format, width, size }) => ({ format, width, href: `${base}/${plate.id}/${size}.${format}` })),
  };
}
