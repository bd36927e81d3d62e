/** Every job of the house and what it is handed. A job can run twice and be killed anywhere. */
export interface JobPayloads {
  'send-letter': { letterId: string };
  'prepare-plate': { plateId: string };
  'press-edition': { editionId: string };
  'sync-tier': { tierId: string };
  'converge-customer': { stripeCustomer: string };
  'reconcile-payments': Record<string, never>;
  'join-demo-members': Record<string, never>;
}
export type JobName = keyof JobPayloads;
