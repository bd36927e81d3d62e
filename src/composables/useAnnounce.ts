import { readonly, ref } from 'vue';

export interface Announcement {
  id: number;
  text: string;
  tone: 'plain' | 'attention';
}

const list = ref<Announcement[]>([]);
let counter = 0;

/** What is on the screen now, for the one part that shows it. */
export const announcements = readonly(list);

export function dismiss(id: number): void {
  list.value = list.value.filter((entry) => entry.id !== id);
}

/**
 * Says a sentence on the screen and to a screen reader. For what was done, not for errors:
 * those stay where they happened (`AppErrorNotice`).
 */
export function announce(text: string, tone: Announcement['tone'] = 'plain'): void {
  counter += 1;
  list.value = [...list.value.slice(-2), { id: counter, text, tone }];
}
