import { ERROR_CODES } from '@shared/contracts/errors.ts';
import { describe, expect, it } from 'vitest';
import { ApiProblem } from '@/api/problem.ts';
import AppErrorNotice from '@/components/AppErrorNotice.vue';
import { errors } from '@/locales/en/errors.ts';
import { globalParts, mount } from './mount-part.ts';

Element.prototype.scrollIntoView = () => undefined;

const mountNotice = (props: { error: unknown; fields?: Record<string, string>; retry?: boolean }) =>
  mount(AppErrorNotice, { props, global: globalParts(), attachTo: document.body });

describe('an error notice', () => {
  it.each(ERROR_CODES)('has a sentence of its own for %s', (code) => {
    const [group = '', name = ''] = code.split('.');
    const sentence = (errors as Record<string, Record<string, string>>)[group]?.[name];
    const notice = mountNotice({ error: new ApiProblem({ code, status: 400 }) });

    expect(sentence).toBeTruthy();
    expect(notice.get('[role="alert"]').text()).toContain(sentence);
  });

  it('links each fault to the field it belongs to', async () => {
    document.body.innerHTML = '<input id="their-address">';
    const notice = mountNotice({
      error: new ApiProblem({
        code: 'request.invalid',
        status: 400,
        faults: [{ path: 'email', message: 'This is not an e-mail address.' }],
      }),
      fields: { email: 'their-address' },
    });

    await notice.get('a[href="#their-address"]').trigger('click');

    expect(document.activeElement?.id).toBe('their-address');
  });

  it('says a fault of no field without a link', () => {
    const faults = [{ path: 'steps.2', message: 'Two steps have the same id.' }];
    const notice = mountNotice({ error: new ApiProblem({ code: 'request.invalid', status: 400, faults }) });

    expect(notice.text()).toContain('Two steps have the same id.');
    expect(notice.find('a').exists()).toBe(false);
  });

  it('names the cycle that the server found', () => {
    const notice = mountNotice({
      error: new ApiProblem({ code: 'recipes.cycle', status: 409, context: { names: ['Sour', 'Syrup', 'Sour'] } }),
    });

    expect(notice.text()).toContain('Sour → Syrup → Sour');
  });

  it('never shows the text of an error that is none of ours', () => {
    const notice = mountNotice({ error: new TypeError('undefined is not a function') });

    expect(notice.text()).toContain(errors.server.failed);
    expect(notice.text()).not.toContain('undefined');
  });

  it('offers to try again only where that is asked for', async () => {
    const error = new ApiProblem({ code: 'client.offline', status: 0 });
    expect(mountNotice({ error }).find('button').exists()).toBe(false);

    const notice = mountNotice({ error, retry: true });
    await notice.get('button').trigger('click');

    expect(notice.emitted('retry')).toHaveLength(1);
  });
});
