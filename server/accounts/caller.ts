import type { Request, Response } from 'express';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { may, type Role } from '../../shared/rules/authorization.ts';
import { HttpProblem, notFound } from '../http/problem.ts';
import type { Services } from '../services.ts';
import { sessionOf, type SignedIn } from './sessions.ts';

/** Who asks, and what they are at the farm of the address. */
export interface Caller extends Omit<SignedIn, 'roles'> {
  /** At the farm of the address; null where the address names none. */
  role: Role | null;
  farmId: string | null;
}

/**
 * Decides whether the request may go on, from the endpoint's line in the authorization table.
 * A farm one does not belong to answers 404, as one that does not exist: ids reveal nothing.
 */
export async function authorize(endpoint: Endpoint, request: Request, response: Response, services: Services): Promise<Caller | null> {
  const { access } = endpoint;
  if (access === 'demo' && !services.settings.demo) throw notFound();
  if (access === 'public' || access === 'demo' || access === 'signature') return null;
  const session = await sessionOf(request, response, services);
  if (!session) throw new HttpProblem(401, 'Sign in, then try again.');
  const { roles, ...person } = session;
  if (access === 'signedIn') return { ...person, role: null, farmId: null };
  const farmId = String(request.params['farmId']);
  const role = roles.get(farmId);
  if (!role) throw notFound();
  if (!may(role, access.action, access.resource)) throw new HttpProblem(403, `As ${role} of this farm you may not do this; ask an owner.`);
  return { ...person, role, farmId };
}
