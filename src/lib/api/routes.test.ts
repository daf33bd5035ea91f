import { describe, expect, it } from 'vitest';
import { allEndpoints } from '../../../shared/api/index.ts';
import { routes } from './routes.ts';

const named = Object.values(routes).flatMap((group) => Object.values(group).map(({ method, path }) => `${method} ${path}`));
const contract = allEndpoints.map(({ method, path }) => `${method} ${path}`);
/** Called by other machines, the service worker or a reader of the API, never by a page. */
const notForPages = ['get /api/health', 'get /api/openapi.json', 'post /api/push/acknowledge', 'post /api/hooks/forecast/:source'];

describe('the table of operations that the pages call', () => {
  it('names only operations of the contract', () => {
    expect(named.filter((operation) => !contract.includes(operation))).toEqual([]);
  });

  it('leaves out no operation that a person needs', () => {
    expect(contract.filter((operation) => !named.includes(operation) && !notForPages.includes(operation))).toEqual([]);
  });
});
