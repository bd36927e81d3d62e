import type { DemoAccounts } from '../../shared/contracts/session.ts';
import type { Role } from '../../shared/contracts/words.ts';

interface DemoAccount {
  email: string;
  part: DemoAccounts['accounts'][number]['part'];
  name: string;
  roles: Role[];
  /** The rank of the membership that the seed buys for them. */
  rank: number | null;
}

/** One password for every account of the demonstration; they exist in demo mode only. */
export const DEMO_PASSWORD = 'slack-water-18';

export const DEMO_ACCOUNTS: readonly DemoAccount[] = [
  { email: 'admin@demo.example', part: 'admin', name: 'Marit Solberg', roles: ['admin'], rank: null },
  { email: 'editor@demo.example', part: 'editor', name: 'Odd Fenwick', roles: ['editor'], rank: null },
  { email: 'creator@demo.example', part: 'creator', name: 'Isla Thorne', roles: ['creator'], rank: null },
  { email: 'member@demo.example', part: 'member', name: 'Tam Birch', roles: [], rank: 1 },
  { email: 'clothbound@demo.example', part: 'clothbound', name: 'Inga Vale', roles: [], rank: 3 },
  { email: 'reader@demo.example', part: 'reader', name: 'Perrin Lowe', roles: [], rank: null },
];
