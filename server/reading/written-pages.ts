import type { WrittenAnswer } from '../http/written-answer.ts';

/** Pages of open recipes as they are sent. What is bound never changes, so no two processes can disagree about them. */
export interface WrittenPages {
  /** The page of this key; written when it is not there yet. The key names everything that the page rests on. */
  take: (key: string, write: () => Promise<WrittenAnswer>) => Promise<WrittenAnswer>;
}

/** Keeps as many pages as are read most often in a book of a few hundred recipes; the oldest one makes room. */
export function keepWrittenPages(most = 500): WrittenPages {
  const pages = new Map<string, WrittenAnswer>();
  return {
    take: async (key, write) => {
      const kept = pages.get(key);
      if (kept) return kept;
      const page = await write();
      if (pages.size >= most) pages.delete(pages.keys().next().value!);
      pages.set(key, page);
      return page;
    },
  };
}
