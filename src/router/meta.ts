import type { Area } from '@/locales/en/index.ts';
import type { Role } from '@shared/contracts/words.ts';
import 'vue-router';

declare module 'vue-router' {
  interface RouteMeta {
    /** Key of the page's title in the catalogue. */
    title?: string;
    /** Who may come here at all; everyone when absent. The server decides again for everything the page asks for. */
    access?: 'signed-in' | 'staff' | readonly Role[];
    /** The catalogue this area brings with it. */
    area?: Area;
    /** Shows drinks: the age check comes first. */
    age?: boolean;
  }
}
