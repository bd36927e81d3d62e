/** Every letter of the house and what its words need. Links are whole addresses, moments ISO 8601, money minor units. */
export interface LetterFields {
  verify: { name: string; link: string };
  reset: { name: string; link: string };
  'email-change': { name: string; link: string; newEmail: string };
  'email-changed': { name: string; oldEmail: string; newEmail: string };
  'email-changing': { name: string; newEmail: string };
  receipt: {
    name: string;
    number: string;
    amount: number;
    currency: string;
    tierName: string;
    paidAt: string;
    href: string | null;
  };
  cancelled: { name: string; tierName: string; endsAt: string };
  'payment-failed': { name: string; tierName: string; link: string };
}
export type LetterKind = keyof LetterFields;
