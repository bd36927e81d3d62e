import { computed, toValue, type ComputedRef, type MaybeRefOrGetter } from 'vue';
import { useI18n } from 'vue-i18n';
import { hasCode } from '@/api/problem.ts';
import { useFaults } from '@/composables/useFaults.ts';

/**
 * Faults by field where a wrong present password and a taken address are refusals of the whole form, but belong to
 * one field of it.
 *
 * @param names the field of the present password, and that of the new address where there is one
 */
export function useSecretFaults(
  error: MaybeRefOrGetter<unknown>,
  names: { secret: string; email?: string },
): ComputedRef<Record<string, string | undefined>> {
  const { t } = useI18n();
  const faults = useFaults(error);
  return computed(() => {
    const problem = toValue(error);
    if (hasCode(problem, 'people.wrong_password')) return { [names.secret]: t('errors.people.wrong_password') };
    if (names.email && hasCode(problem, 'people.email_taken')) return { [names.email]: t('account.email.taken') };
    return faults.value;
  });
}
