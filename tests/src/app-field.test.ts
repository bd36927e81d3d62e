import { describe, expect, it } from 'vitest';
import AppField from '@/components/AppField.vue';
import { globalParts, mount } from './mount-part.ts';

const mountField = (props: Record<string, unknown>) =>
  mount(AppField, { props: { label: 'Batch volume', ...props }, global: globalParts(), attachTo: document.body });

// Names and descriptions as in WCAG 2.2, success criteria 1.3.1, 3.3.1 and 3.3.2.
describe('a field', () => {
  it('names its control by the label above it', () => {
    const field = mountField({ id: 'volume' });
    const control = field.get('input');

    expect(field.get('label').attributes('for')).toBe('volume');
    expect(control.attributes('id')).toBe('volume');
    expect(control.attributes('aria-labelledby')).toBe('volume-label');
    expect(field.get('#volume-label').text()).toBe('Batch volume');
  });

  it('describes its control by the hint and the error, and marks it as invalid', () => {
    const field = mountField({ id: 'keeping', hint: 'Counted from bottling.', error: 'Say the unit: days or weeks.' });
    const control = field.get('input');

    expect(control.attributes('aria-describedby')).toBe('keeping-hint keeping-error');
    expect(control.attributes('aria-invalid')).toBe('true');
    expect(field.get('#keeping-error').text()).toBe('Say the unit: days or weeks.');
  });

  it('says nothing of an error where there is none', () => {
    const control = mountField({}).get('input');

    expect(control.attributes('aria-invalid')).toBeUndefined();
    expect(control.attributes('aria-describedby')).toBeUndefined();
  });

  it('hands on what is typed, as text', async () => {
    const field = mountField({ modelValue: '' });
    await field.get('input').setValue('720 ml');

    expect(field.emitted('update:modelValue')?.at(-1)).toEqual(['720 ml']);
  });

  it('takes several lines where asked', () => {
    expect(mountField({ type: 'textarea', rows: 4 }).get('textarea').attributes('rows')).toBe('4');
  });
});
