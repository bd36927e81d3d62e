import type { Figure } from '@shared/contracts/figures.ts';
import type { ReadingView } from '@shared/contracts/reading.ts';
import { writeAmount } from '@shared/engine/amount-text.ts';
import { computed, toValue, type MaybeRefOrGetter } from 'vue';
import { useI18n } from 'vue-i18n';
import type { Fact } from '@/components/AppFacts.vue';
import { NBSP } from './format.ts';
import { useFormat } from './useFormat.ts';

/** The strip of facts under a recipe's headnote; what is not known says so. */
export function useRecipeFacts(recipe: MaybeRefOrGetter<ReadingView>, factor: MaybeRefOrGetter<number> = 1) {
  const { t, locale } = useI18n();
  const format = useFormat();

  return computed<Fact[]>(() => {
    const view = toValue(recipe);
    const rest = view.view === 'open' ? [keepingOf(view)] : [containsOf(view)];
    return [yieldOf(view), strengthOf(view), timeOf(view), ...rest];
  });

  function yieldOf(view: ReadingView): Fact {
    const label = t('reading.facts.yield');
    const known = view.view === 'open' ? view.figures.yieldMl : null;
    const stated = view.yieldStated;
    const servings = servingsOf(view);
    if (known?.known) return { label, value: volume(known), small: servings, how: how(known) };
    if (stated) {
      const times = { min: stated.amount.min * toValue(factor), max: stated.amount.max * toValue(factor) };
      const { text, plural } = writeAmount(times, stated.unit, locale.value);
      const unit = t(`words.unit.${stated.unit}`, plural > 1 ? 2 : 1);
      // A drink is its own serving.
      const small = stated.unit === 'drink' ? undefined : servings;
      return { label, value: `${text}${NBSP}${unit}`, small, how: t('words.provenance.stated') };
    }
    return { label, value: servings ?? t('reading.facts.notStated') };
  }

  function volume({ min, max }: { min: number; max: number }): string {
    const times = { min: min * toValue(factor), max: max * toValue(factor) };
    const litres = times.max >= 2000;
    const shown = litres ? { min: times.min / 1000, max: times.max / 1000 } : times;
    return `${format.range(shown, litres ? 2 : 0)}${NBSP}${litres ? 'l' : 'ml'}`;
  }

  function servingsOf(view: ReadingView): string | undefined {
    if (view.servings === null) return undefined;
    const count = view.servings * toValue(factor);
    return t('reading.facts.servings', { n: format.number(count) }, count > 1 ? 2 : 1);
  }

  function strengthOf(view: ReadingView): Fact {
    const label = t('reading.facts.strength');
    const band = view.band ? t(`words.band.${view.band}`) : null;
    if (view.view === 'open' && view.figures.strength.known && view.band !== 'none') {
      const { strength } = view.figures;
      return {
        label,
        value: `${format.range(strength)}${NBSP}%${NBSP}vol`,
        small: band ?? undefined,
        how: how(strength),
      };
    }
    return { label, value: band ?? t('reading.facts.unknown') };
  }

  function timeOf(view: ReadingView): Fact {
    const label = t('reading.facts.time');
    if (view.view === 'open') {
      const { handsOn, waiting, total } = view.figures.times;
      if (handsOn.known && waiting.known)
        return {
          label,
          value: format.durationRange(handsOn),
          small: waiting.max > 0 ? t('reading.facts.waiting', { time: format.durationRange(waiting) }) : undefined,
          how: how(total),
        };
    }
    const { totalTime } = view;
    return { label, value: totalTime.known ? format.durationRange(totalTime) : t('reading.facts.unknown') };
  }

  function keepingOf({ keeping, kind }: Extract<ReadingView, { view: 'open' }>): Fact {
    const label = t('reading.facts.keeping');
    if (!keeping)
      return { label, value: t(kind === 'drink' ? 'words.keeping.serve-at-once' : 'reading.facts.notStated') };
    const place = t(`words.keeping.${keeping.place}`);
    if (!keeping.days) return { label, value: place, how: t(`words.keepingBasis.${keeping.basis}`) };
    const days = { min: keeping.days.min * 86_400, max: keeping.days.max * 86_400 };
    const degrees = keeping.temperature ? `, ${format.range(keeping.temperature, 0)}${NBSP}°C` : '';
    return {
      label,
      value: format.durationRange(days),
      small: `${place}${degrees}`,
      how: t(`words.keepingBasis.${keeping.basis}`),
    };
  }

  function containsOf(view: ReadingView): Fact {
    const names = view.allergens.map(({ allergen }) => t(`words.allergen.${allergen}`));
    return {
      label: t('reading.facts.contains'),
      value: names.length > 0 ? names.join(', ') : t('reading.facts.noAllergen'),
      small: view.allergensUnknown ? t('reading.facts.allergensPartly') : undefined,
    };
  }

  function how(figure: Figure): string | undefined {
    return figure.known ? t(`words.provenance.${figure.how}`) : undefined;
  }
}
