import type { Kinds } from './wire.ts';
import type { CardBehaviour } from './cards.ts';

/** A charge or credit for part of a period, waiting for the next invoice. */
export interface PendingLine {
  amount: number;
  description: string;
  price: string;
  product: string;
  unitAmount: number;
  quantity: number;
  period: { start: number; end: number };
  subscriptionItem: string;
}

/** What a checkout page will start once it is paid. */
export interface CheckoutPlan {
  items: { id: string; price: string; quantity: number }[];
  metadata: Record<string, string>;
  description: string | null;
  trialDays: number | null;
  trialEnd: number | null;
}

/** What the fake must remember of an object and the API never shows. */
export interface Hidden {
  card?: CardBehaviour;
  plan?: CheckoutPlan;
  /** The card entered on a checkout page while its challenge is open. */
  challenged?: Kinds['payment_method'];
  pendingLines?: PendingLine[];
  trialNoticeSent?: boolean;
}
