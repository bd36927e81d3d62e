import { readonly, shallowRef } from 'vue';

export interface Question {
  title: string;
  text: string;
  yes: string;
  no: string;
  /** Whether saying yes destroys something. */
  danger?: boolean;
}

interface Asked extends Question {
  answer: (yes: boolean) => void;
}

const asked = shallowRef<Asked | null>(null);

/** The question on the screen, for the one dialog that shows it. */
export const openQuestion = readonly(asked);

/**
 * A function that asks and resolves to the answer; closing the dialog says no.
 *
 * @example if (await confirm({ title, text, yes, no, danger: true })) await remove();
 */
export function useConfirm(): (question: Question) => Promise<boolean> {
  return (question) =>
    new Promise((resolve) => {
      asked.value?.answer(false);
      asked.value = {
        ...question,
        answer(yes) {
          asked.value = null;
          resolve(yes);
        },
      };
    });
}
