import { useQuery } from '@pinia/colada';
import { computed } from 'vue';
import { fetchContents, fetchReading, fetchShelf } from '@/api/reading.ts';
import { fetchTiers } from '@/api/tiers.ts';
import { pickSamples } from '@/components/front/samples.ts';
import { useSessionStore } from '@/stores/session.ts';

/** What the front door shows: the shelf to everyone, the contents and samples of its first book past the age check. */
export function useFrontDoor() {
  const session = useSessionStore();
  const reader = computed(() => session.user?.id ?? 'visitor');

  const { data: shelf, error, refetch } = useQuery({ key: ['shelf'], query: fetchShelf });
  const { data: tiers } = useQuery({ key: ['tiers'], query: fetchTiers });
  const book = computed(() => shelf.value?.books[0]);
  const slug = computed(() => book.value?.slug ?? '');

  const contents = useQuery({
    key: () => ['contents', slug.value, 'self', reader.value],
    query: () => fetchContents(slug.value),
    enabled: () => session.ageConfirmed && slug.value !== '',
  });
  const samples = computed(() => (contents.data.value ? pickSamples(contents.data.value) : []));
  const lead = computed(() => samples.value[0]?.slug ?? '');
  // Contents carry small plates only; the leading sample is shown large.
  const leading = useQuery({
    key: () => ['reading', slug.value, lead.value, 'self', reader.value],
    query: () => fetchReading(slug.value, lead.value),
    enabled: () => session.ageConfirmed && lead.value !== '',
  });

  return {
    shelf,
    book,
    error,
    refetch,
    tiers: computed(() => tiers.value ?? []),
    contents: contents.data,
    contentsError: contents.error,
    refetchContents: contents.refetch,
    samples,
    leadPlate: computed(() => leading.data.value?.plate),
  };
}
