import type { RouteRecordRaw } from 'vue-router';
import { frontRoutes } from './front.ts';
import { officeRoutes } from './office.ts';
import { readingRoutes } from './reading.ts';
import { workroomRoutes } from './workroom.ts';
import './meta.ts';

// The front door comes first: the bare frame of the reading room also answers to `/`.
export const routes: RouteRecordRaw[] = [...frontRoutes, ...readingRoutes, ...workroomRoutes, ...officeRoutes];
