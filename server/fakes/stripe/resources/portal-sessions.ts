import type { Stripe } from 'stripe';
import { z } from 'zod';
import { newId } from '../ids.ts';
import { emptyable, flag, mergeMetadata, metadata, paging, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { all, create, listOf, read } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';

const sessionParams = shape<Stripe.BillingPortal.SessionCreateParams>()({
  customer: text,
  configuration: text.optional(),
  locale: z.enum(['auto', 'en', 'en-GB']).optional(),
  return_url: z.url().optional(),
});

const configurationParams = shape<Stripe.BillingPortal.ConfigurationCreateParams>()({
  features: z.strictObject({
    invoice_history: z.strictObject({ enabled: flag }).optional(),
    payment_method_update: z.strictObject({ enabled: flag }).optional(),
    subscription_cancel: z.strictObject({ enabled: flag, mode: z.literal('at_period_end').optional() }).optional(),
  }),
  business_profile: z
    .strictObject({
      headline: emptyable(text).optional(),
      privacy_policy_url: z.url().optional(),
      terms_of_service_url: z.url().optional(),
    })
    .optional(),
  default_return_url: emptyable(z.url()).optional(),
  metadata: metadata.optional(),
  name: emptyable(text).optional(),
});
const listParams = shape<Stripe.BillingPortal.ConfigurationListParams>()({
  ...paging,
  active: flag.optional(),
  is_default: flag.optional(),
});

type ConfigurationFields = Partial<z.output<typeof configurationParams>>;

function newConfiguration(
  fields: ConfigurationFields,
  now: number,
  isDefault: boolean,
): Kinds['billing_portal.configuration'] {
  const { features = {}, business_profile: profile } = fields;
  return {
    id: newId('bpc'),
    object: 'billing_portal.configuration',
    active: true,
    application: null,
    business_profile: {
      headline: profile?.headline ?? null,
      privacy_policy_url: profile?.privacy_policy_url ?? null,
      terms_of_service_url: profile?.terms_of_service_url ?? null,
    },
    created: now,
    default_return_url: fields.default_return_url ?? null,
    features: {
      customer_update: { allowed_updates: [], enabled: false },
      invoice_history: { enabled: features.invoice_history?.enabled ?? isDefault },
      payment_method_update: {
        enabled: features.payment_method_update?.enabled ?? isDefault,
        payment_method_configuration: null,
      },
      subscription_cancel: {
        cancellation_reason: { enabled: false, feedback_options: null, options: [] },
        enabled: features.subscription_cancel?.enabled ?? isDefault,
        mode: 'at_period_end',
        proration_behavior: 'none',
      },
      subscription_pause: { duration: { interval_options: [], type: 'indefinite' }, enabled: false },
      subscription_update: {
        billing_cycle_anchor: null,
        default_allowed_updates: [],
        enabled: false,
        proration_behavior: 'none',
        schedule_at_period_end: { conditions: [] },
        trial_update_behavior: 'end_trial',
      },
    },
    is_default: isDefault,
    livemode: false,
    login_page: { enabled: false, url: null },
    metadata: mergeMetadata(null, fields.metadata),
    name: fields.name ?? null,
    updated: now,
  };
}

async function defaultConfiguration(work: Work): Promise<Kinds['billing_portal.configuration']> {
  const [kept] = await all(work.db, 'billing_portal.configuration', { is_default: 'true' });
  return kept?.data ?? create(work, 'billing_portal.configuration', newConfiguration({}, work.now, true));
}

export const portalRoutes = [
  route('post', '/billing_portal/sessions', sessionParams, async (work, params) => {
    await read(work.db, 'customer', params.customer, 'customer');
    const configuration = params.configuration
      ? await read(work.db, 'billing_portal.configuration', params.configuration, 'configuration')
      : await defaultConfiguration(work);
    const id = newId('bps');
    return create(work, 'billing_portal.session', {
      id,
      object: 'billing_portal.session',
      configuration: configuration.id,
      created: work.now,
      customer: params.customer,
      customer_account: null,
      flow: null,
      livemode: false,
      locale: params.locale ?? null,
      on_behalf_of: null,
      return_url: params.return_url ?? configuration.default_return_url,
      url: `${work.origin}/portal/${id}`,
    });
  }),

  route('post', '/billing_portal/configurations', configurationParams, async (work, params) =>
    create(work, 'billing_portal.configuration', newConfiguration(params, work.now, false), {
      event: 'billing_portal.configuration.created',
    }),
  ),

  route('get', '/billing_portal/configurations/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'billing_portal.configuration', id),
  ),

  route(
    'get',
    '/billing_portal/configurations',
    listParams,
    async (work, { active, is_default: isDefault, ...cursors }) =>
      listOf(work.db, 'billing_portal.configuration', '/v1/billing_portal/configurations', {
        paging: cursors,
        equal: { active, is_default: isDefault },
      }),
  ),
];
