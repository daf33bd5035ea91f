import type { Express, Request, RequestHandler, Response } from 'express';
import type { z } from 'zod';
import { allEndpoints } from '../../shared/api/index.ts';
import { plainMessages } from '../../shared/api/messages.ts';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import type { Role } from '../../shared/rules/authorization.ts';
import { authorize, type Caller } from '../accounts/caller.ts';
import type { Services } from '../services.ts';
import { HttpProblem, invalid, problemsOf, type ProblemItem } from './problem.ts';
import { bodyReaderFor, namedAddressLimiterFor, rateLimiterFor } from './middleware.ts';

/** JSON text that is sent as it is: for answers kept ready in the database. */
export class ReadyJson {
  readonly text: string;
  constructor(text: string) {
    this.text = text;
  }
}

/** The handler has written the response itself (a file, an event stream). */
export const alreadySent = Symbol('already sent');

export interface Context<E extends Endpoint> {
  services: Services;
  params: z.infer<E['params']>;
  query: z.infer<E['query']>;
  body: z.infer<E['body']>;
  /** Who asks; null only where access is public, signature or demo. */
  caller: Caller | null;
  request: Request;
  response: Response;
}

export type Handler<E extends Endpoint> = (context: Context<E>) => Promise<z.input<E['answer']> | ReadyJson | typeof alreadySent>;
export type Register = <E extends Endpoint>(endpoint: E, handler: Handler<E>) => void;

function parsePart(schema: z.ZodType, value: unknown, prefix: string, problems: ProblemItem[]): unknown {
  const parsed = schema.safeParse(value, { error: plainMessages });
  if (parsed.success) return parsed.data;
  problems.push(...problemsOf(parsed.error).map((item) => ({ ...item, path: [prefix, item.path].filter(Boolean).join('.') })));
  return undefined;
}

/** Callers as decided, from the step that decides to the step that does. */
const callers = new WeakMap<Request, Caller | null>();

const authorizeFor =
  (endpoint: Endpoint, services: Services): RequestHandler =>
  async (request, response, next) => {
    // Answers are about persons and change with time: no cache keeps one without asking again.
    response.setHeader('Cache-Control', 'private, no-cache');
    callers.set(request, await authorize(endpoint, request, response, services));
    next();
  };

/**
 * Registers operations as rows of rate limit → authorize → read the body → validate → do → present.
 * Whoever may not do a thing has no body read.
 * `finish` fails when an operation of the contract has no handler: what is described exists.
 */
export function createRegister(app: Express, services: Services): { register: Register; finish: () => void } {
  const done = new Set<string>();
  const register: Register = (endpoint, handler) => {
    if (done.has(endpoint.id)) throw new Error(`Operation ${endpoint.id} is registered twice.`);
    done.add(endpoint.id);
    const before = [...rateLimiterFor(endpoint, services), authorizeFor(endpoint, services), ...bodyReaderFor(endpoint), ...namedAddressLimiterFor(endpoint, services)];
    app[endpoint.method](endpoint.path, ...before, async (request, response) => {
      const caller = callers.get(request) ?? null;
      const badAddress: ProblemItem[] = [];
      const params = parsePart(endpoint.params, request.params, '', badAddress);
      if (badAddress.length > 0) throw new HttpProblem(404, 'The address names nothing that exists.');
      const problems: ProblemItem[] = [];
      const query = parsePart(endpoint.query, request.query, 'query', problems);
      const body = endpoint.bodyKind === 'raw' || endpoint.bodyKind === 'multipart' ? request.body : parsePart(endpoint.body, request.body ?? undefined, '', problems);
      if (problems.length > 0) throw invalid(problems);
      const answer = await handler({ services, params, query, body, caller, request, response } as Context<typeof endpoint>);
      if (answer === alreadySent) return;
      if (answer instanceof ReadyJson) response.status(endpoint.status).type('application/json').send(answer.text);
      else if (endpoint.status === 204 || answer === undefined) response.status(endpoint.status).end();
      else response.status(endpoint.status).json(answer);
    });
  };
  const finish = () => {
    const missing = allEndpoints.filter((endpoint) => !done.has(endpoint.id)).map((endpoint) => endpoint.id);
    if (missing.length > 0) throw new Error(`Operations without a handler: ${missing.join(', ')}.`);
  };
  return { register, finish };
}

/** The caller of an operation that needs one. */
export function signedIn(caller: Caller | null): Caller {
  if (!caller) throw new HttpProblem(401, 'Sign in, then try again.');
  return caller;
}

export type { Caller, Role };
