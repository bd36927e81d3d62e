import { checkoutSessionRoutes } from './resources/checkout-sessions.ts';
import { couponRoutes } from './resources/coupons.ts';
import { customerRoutes } from './resources/customers.ts';
import { eventRoutes } from './resources/events.ts';
import { invoiceRoutes } from './resources/invoices.ts';
import { paymentMethodRoutes } from './resources/payment-methods.ts';
import { paymentRoutes } from './resources/payments.ts';
import { portalRoutes } from './resources/portal-sessions.ts';
import { priceRoutes } from './resources/prices.ts';
import { productRoutes } from './resources/products.ts';
import { subscriptionRoutes } from './resources/subscriptions.ts';
import { testClockRoutes } from './resources/test-clocks.ts';
import type { Route } from './route.ts';

/** Every call that the fake acts out; where two paths match, the first one answers. */
export const API_ROUTES: Route[] = [
  ...productRoutes,
  ...priceRoutes,
  ...couponRoutes,
  ...customerRoutes,
  ...paymentMethodRoutes,
  ...checkoutSessionRoutes,
  ...portalRoutes,
  ...subscriptionRoutes,
  ...invoiceRoutes,
  ...paymentRoutes,
  ...eventRoutes,
  ...testClockRoutes,
];
