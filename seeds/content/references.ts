import { LARDER } from '../../shared/larder/index.ts';
import type { RecipeFile } from './recipe-files.ts';

/** Throws at the first ingredient, component or plate that does not exist, and at a slug used twice. */
export function refuseUnknown(files: readonly RecipeFile[], plateFiles: ReadonlySet<string>): void {
  const larderIds = new Set(LARDER.map((item) => item.id));
  const slugs = new Set<string>();
  for (const { slug, source } of files) {
    if (slugs.has(slug)) source.refuse([], `Another recipe is called "${slug}" already.`);
    slugs.add(slug);
  }
  for (const { source, written } of files) {
    if (written.plate !== undefined && !plateFiles.has(written.plate))
      source.refuse(['plate'], 'This is not among the plates.');
    written.sections.forEach((section, s) =>
      section.lines.forEach(({ larder, component }, l) => {
        const place = ['sections', s, 'lines', l];
        if (larder !== undefined && !larderIds.has(larder))
          source.refuse([...place, 'larder'], `There is no "${larder}" in the larder.`);
        if (component !== undefined && !slugs.has(component))
          source.refuse([...place, 'component'], `There is no recipe "${component}".`);
      }),
    );
  }
}

/** Throws where a recipe is made from itself, naming the way round. */
export function refuseCycles(files: readonly RecipeFile[]): void {
  const bySlug = new Map(files.map((file) => [file.slug, file]));
  const follow = (file: RecipeFile, trail: readonly string[]): void => {
    const walked = [...trail, file.slug];
    if (trail.includes(file.slug)) file.source.refuse([], `Components lead in a circle: ${walked.join(', ')}.`);
    for (const component of componentsOf(file)) {
      const next = bySlug.get(component);
      if (next) follow(next, walked);
    }
  };
  for (const file of files) follow(file, []);
}

function componentsOf({ written }: RecipeFile): string[] {
  return written.sections.flatMap((section) =>
    section.lines.flatMap(({ component }) => (component === undefined ? [] : [component])),
  );
}
