import { accountEndpoints } from './accounts.ts';
import type { Endpoint } from './endpoint.ts';
import { farmEndpoints } from './farms.ts';
import { morningEndpoints } from './mornings.ts';
import { hookEndpoints, noticeEndpoints, webhookEndpoints } from './notices.ts';
import { peopleEndpoints } from './people.ts';
import { planEndpoints, productEndpoints } from './plans.ts';
import { demoEndpoints, systemEndpoints } from './system.ts';

const groups = [
  systemEndpoints,
  demoEndpoints,
  accountEndpoints,
  farmEndpoints,
  productEndpoints,
  { plans: planEndpoints },
  morningEndpoints,
  noticeEndpoints,
  webhookEndpoints,
  hookEndpoints,
  peopleEndpoints,
];

const isEndpoint = (value: object): value is Endpoint => 'path' in value && 'method' in value;

function flatten(group: object): Endpoint[] {
  return Object.values(group).flatMap((value: object) => (isEndpoint(value) ? [value] : flatten(value)));
}

/** Every operation of the API: what is not in this list does not exist. */
export const allEndpoints: readonly Endpoint[] = groups.flatMap(flatten);
