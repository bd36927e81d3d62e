import type { Credentials, SessionView } from '@shared/contracts/session.ts';
import type { Role } from '@shared/contracts/words.ts';
import { useQueryCache } from '@pinia/colada';
import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import { closeSession, fetchSession, openSession } from '@/api/session.ts';

/** Who is at the screen. The server decides what they may read; this only decides what to show. */
export const useSessionStore = defineStore('session', () => {
  const cache = useQueryCache();
  const view = ref<SessionView | null>(null);
  let loading: Promise<void> | null = null;

  const user = computed(() => view.value?.user ?? null);
  const tier = computed(() => view.value?.tier ?? null);
  const roles = computed<readonly Role[]>(() => user.value?.roles ?? []);
  const isStaff = computed(() => roles.value.length > 0);
  const ageConfirmed = computed(() => view.value?.ageConfirmed ?? false);
  const demo = computed(() => view.value?.demo ?? false);
  const imprint = computed(() => view.value?.imprint ?? null);

  /** Asks the server again who is here: after signing in, verifying, joining, or answering the age check. */
  async function load(): Promise<void> {
    loading = fetchSession().then((fresh) => {
      view.value = fresh;
    });
    try {
      await loading;
    } catch (error) {
      loading = null;
      throw error;
    }
  }

  /** Resolves once it is known who is here. Asks only the first time. */
  async function ready(): Promise<void> {
    await (loading ?? load());
  }

  function hasRole(...wanted: Role[]): boolean {
    return wanted.some((role) => roles.value.includes(role));
  }

  async function signIn(credentials: Credentials): Promise<void> {
    await openSession(credentials);
    await load();
    forgetAnswers();
  }

  async function signOut(): Promise<void> {
    await closeSession();
    await load();
    forgetAnswers();
  }

  /** What was answered to one reader must not be shown to the next, nor to the same one whose rights have changed. */
  function forgetAnswers(): void {
    for (const entry of cache.getEntries({ active: false })) cache.remove(entry);
    void cache.invalidateQueries();
  }

  return {
    view,
    user,
    tier,
    roles,
    isStaff,
    ageConfirmed,
    demo,
    imprint,
    load,
    ready,
    hasRole,
    signIn,
    signOut,
    forgetAnswers,
  };
});
