import { computed } from 'vue';
import { useRoute } from 'vue-router';
import { useSessionStore } from '@/stores/session.ts';

/** Staff may read as a visitor (`?as=0`) or as a member of a rank; for everyone else the address says nothing. */
export function useReadingAs() {
  const route = useRoute();
  const session = useSessionStore();
  const as = computed(() => {
    const asked = Number(route.query.as);
    return session.isStaff && route.query.as !== undefined && Number.isInteger(asked) && asked >= 0 ? asked : undefined;
  });
  /** What links to other pages of the same reading carry on. */
  const query = computed(() => (as.value === undefined ? {} : { as: String(as.value) }));
  return { as, query };
}
