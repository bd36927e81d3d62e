import type { RouteRecordRaw } from 'vue-router';
import { frontRoutes } from './front.ts';
import { officeRoutes } from './office.ts';
import { readingRoutes } from './reading.ts';
import { workroomRoutes } from './workroom.ts';
import './meta.ts';

export const routes: RouteRecordRaw[] = [...readingRoutes, ...workroomRoutes, ...officeRoutes, ...frontRoutes];
