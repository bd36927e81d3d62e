import { useEventListener } from '@vueuse/core';
import { toValue, type MaybeRefOrGetter } from 'vue';
import { useI18n } from 'vue-i18n';
import { onBeforeRouteLeave, onBeforeRouteUpdate } from 'vue-router';
import { useConfirm } from './useConfirm.ts';

/**
 * Asks before text that is not saved is lost, by another page of ours, a reload or a closed tab.
 *
 * @example useUnsavedGuard(() => form.value !== saved.value)
 */
export function useUnsavedGuard(dirty: MaybeRefOrGetter<boolean>): void {
  const { t } = useI18n();
  const confirm = useConfirm();

  onBeforeRouteLeave(mayLeave);
  // The same page with other parameters is another text; a changed query or hash is not.
  onBeforeRouteUpdate((to, from) => to.path === from.path || mayLeave());
  useEventListener(window, 'beforeunload', (event) => {
    if (toValue(dirty)) event.preventDefault();
  });

  async function mayLeave(): Promise<boolean> {
    if (!toValue(dirty)) return true;
    return confirm({
      title: t('common.unsaved.title'),
      text: t('common.unsaved.text'),
      yes: t('common.unsaved.leave'),
      no: t('common.unsaved.stay'),
      danger: true,
    });
  }
}
