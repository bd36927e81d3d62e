import type {
  Keeping,
  RecipeDocument,
  RecipeLine,
  RecipeStep,
  RecipeYield,
} from '@shared/contracts/recipe-document.ts';
import type { Unit } from '@shared/contracts/words.ts';
import { useI18n } from 'vue-i18n';
import { writeDays, writeDuration, writeMeasure, writeTemperature } from '@/components/editor/entries.ts';
import type { Difference } from './document-differences.ts';

type Field = Extract<Difference, { part: 'field' }>['field'];

/** A difference as a person reads it; null on the side where the thing is not. */
export interface DifferenceWords {
  label: string;
  before: string | null;
  after: string | null;
}

/** Puts parts of a recipe into words, to lay two texts beside each other. */
export function useDifferenceWords() {
  const { t } = useI18n();
  const nameOf = (unit: Unit) => [t(`words.unit.${unit}`, 1), t(`words.unit.${unit}`, 2)];

  function wordsOf(difference: Difference): DifferenceWords {
    switch (difference.part) {
      case 'field': {
        const { field, before, after } = difference;
        return { label: fieldName(field), before: sayField(field, before), after: sayField(field, after) };
      }
      case 'section':
        return {
          label: t('workroom.margin.part.section'),
          before: difference.before ?? null,
          after: difference.after ?? null,
        };
      case 'line':
        return {
          label: t('workroom.margin.part.line', { name: (difference.after ?? difference.before)?.name ?? '' }),
          before: sayLine(difference.before),
          after: sayLine(difference.after),
        };
      case 'step':
        return {
          label: t('workroom.margin.part.step', { n: difference.number }),
          before: sayStep(difference.before),
          after: sayStep(difference.after),
        };
      case 'order':
        return { label: t(`workroom.margin.order.${difference.of}`), before: null, after: null };
    }
  }

  function fieldName(field: Field): string {
    return t(`workroom.margin.field.${field}`);
  }

  function sayField(field: Field, value: unknown): string {
    if (value === null || value === '') return '';
    if (field === 'kind') return t(`words.kind.${value as RecipeDocument['kind']}`);
    if (field === 'yield') return sayYield(value as RecipeYield);
    if (field === 'keeping') return sayKeeping(value as Keeping);
    if (field === 'leadPlateId') return t('workroom.margin.aPlate');
    if (field === 'extraAllergens')
      return (value as RecipeDocument['extraAllergens']).map((name) => t(`words.allergen.${name}`)).join(', ');
    if (field === 'extraCautions')
      return (value as RecipeDocument['extraCautions']).map((name) => t(`words.caution.${name}.title`)).join(', ');
    return Array.isArray(value) ? value.join(', ') : String(value);
  }

  function sayLine(line: RecipeLine | undefined): string | null {
    if (!line) return null;
    const { amount, unit, name, prep, note, optional, alternativeTo, scaling } = line;
    const rule = scaling.rule === 'linear' ? '' : t(`workroom.editor.scaling.${scaling.rule}`);
    return [
      [writeMeasure({ amount, unit }, nameOf), name].filter(Boolean).join(' '),
      ...[prep, note, rule],
      optional && t('workroom.editor.line.optional'),
      alternativeTo && t('workroom.editor.line.standsIn'),
    ]
      .filter(Boolean)
      .join(', ');
  }

  function sayStep(step: RecipeStep | undefined): string | null {
    if (!step) return null;
    const { text, duration, temperature, operation, tools, attention } = step;
    const rest = [
      writeDuration(duration),
      writeTemperature(temperature),
      operation && t(`words.operation.${operation.kind}`),
      t(`words.attention.${attention}`),
      tools.join(', '),
    ].filter(Boolean);
    return `${text} (${rest.join('; ')})`;
  }

  function sayYield({ stated, measured, servings, servingSize }: RecipeYield): string {
    const single = (value: RecipeYield['measured']) =>
      value ? writeMeasure({ amount: { min: value.amount, max: value.amount }, unit: value.unit }, nameOf) : '';
    const parts: [string, string][] = [
      [t('workroom.editor.yield.stated'), stated ? writeMeasure(stated, nameOf) : ''],
      [t('workroom.editor.yield.measured'), single(measured)],
      [t('workroom.editor.yield.servings'), servings === null ? '' : String(servings)],
      [t('workroom.editor.yield.servingSize'), single(servingSize)],
    ];
    return parts
      .filter(([, said]) => said !== '')
      .map(([label, said]) => `${label}: ${said}`)
      .join('; ');
  }

  function sayKeeping({ place, days, temperature, basis, note }: Keeping): string {
    return [
      t(`words.keeping.${place}`),
      days && t('workroom.margin.days', { n: writeDays(days) }),
      writeTemperature(temperature),
      t(`words.keepingBasis.${basis}`),
      note,
    ]
      .filter(Boolean)
      .join('; ');
  }

  return { wordsOf, fieldName, sayField, sayLine, sayStep };
}
