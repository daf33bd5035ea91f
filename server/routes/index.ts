import type { Register } from '../http/route.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';
import { accountRoutes } from './accounts.ts';
import { demoRoutes } from './demo.ts';
import { farmRoutes } from './farms.ts';
import { hookRoutes } from './hooks.ts';
import { morningRoutes } from './mornings.ts';
import { noticeRoutes } from './notices.ts';
import { peopleRoutes } from './people.ts';
import { planRoutes } from './plans.ts';
import { productRoutes } from './products.ts';
import { systemRoutes } from './system.ts';
import { webhookRoutes } from './webhooks.ts';

/** Every route file once; the registrar then checks that no operation of the contract is left over. */
export function registerRoutes(register: Register, services: Services, parts: Parts): void {
  systemRoutes(register, services, parts);
  demoRoutes(register, services, parts);
  accountRoutes(register, services);
  farmRoutes(register, services, parts);
  productRoutes(register, services, parts);
  planRoutes(register, services, parts);
  morningRoutes(register, services, parts);
  noticeRoutes(register, services, parts);
  webhookRoutes(register, services, parts);
  hookRoutes(register, services, parts);
  peopleRoutes(register, services);
}
