import { computed, ref, type Ref } from 'vue';
import { useI18n } from 'vue-i18n';
import { uploadPlates } from '@/api/plates.ts';
import { ApiProblem } from '@/api/problem.ts';

export type UploadState = 'waiting' | 'sending' | 'kept' | 'refused' | 'unsent';

/** One chosen file and what came of it. */
export interface Upload {
  file: File;
  state: UploadState;
  /** Why it was refused or did not arrive, in words. */
  reason: string;
}

/**
 * Sends pictures one after the other, so that each has its own answer and one that is refused holds up no other. `onKept` is
 * told after each that the house has kept.
 */
export function usePlateUpload(onKept: () => void) {
  const { t, te } = useI18n();
  const uploads = ref([]) as Ref<Upload[]>;
  const sending = ref(false);

  const done = computed(() => uploads.value.filter(({ state }) => state !== 'waiting' && state !== 'sending').length);
  const counts = computed(() => ({
    kept: uploads.value.filter(({ state }) => state === 'kept').length,
    refused: uploads.value.filter(({ state }) => state === 'refused' || state === 'unsent').length,
  }));

  function add(files: Iterable<File>): void {
    for (const file of files) uploads.value.push({ file, state: 'waiting', reason: '' });
    void sendAll();
  }

  /** What did not arrive goes again; what was refused would be refused again. */
  function sendAgain(): void {
    for (const upload of uploads.value) if (upload.state === 'unsent') upload.state = 'waiting';
    void sendAll();
  }

  async function sendAll(): Promise<void> {
    if (sending.value) return;
    sending.value = true;
    for (let next = waiting(); next; next = waiting()) await send(next);
    sending.value = false;
  }
  const waiting = () => uploads.value.find(({ state }) => state === 'waiting');

  async function send(upload: Upload): Promise<void> {
    upload.state = 'sending';
    try {
      const { refused } = await uploadPlates([upload.file]);
      const [refusal] = refused;
      upload.state = refusal ? 'refused' : 'kept';
      if (refusal) upload.reason = te(`errors.${refusal.code}`) ? t(`errors.${refusal.code}`) : refusal.reason;
      else onKept();
    } catch (error) {
      const code = error instanceof ApiProblem ? error.code : 'server.failed';
      upload.state = code === 'plates.too_large' || code === 'request.too_large' ? 'refused' : 'unsent';
      upload.reason = t(`errors.${code}`);
    }
  }

  function clear(): void {
    uploads.value = [];
  }

  return { uploads, sending, done, counts, add, sendAgain, clear };
}
