import type { AnswerOf, BodyInputOf, Endpoint, Method, ParamsOf, QueryOf } from '../../../shared/api/endpoint.ts';
import { noAnswer, problemFrom } from './problem.ts';

/**
 * An operation as the browser needs it: method and path, with the contract's types and without its schemas,
 * so that the first page loads no zod. `routes.test.ts` holds the table against the contract.
 */
export interface Route<E extends Endpoint> {
  readonly method: Method;
  readonly path: string;
  /** Carries the type only. */
  readonly contract?: E;
}

export const route = <E extends Endpoint>(method: Method, path: string): Route<E> => ({ method, path });

type Part<Name extends string, T> = T extends Record<string, never> ? { [K in Name]?: never } : { [K in Name]: T };
type Optional<Name extends string, T> = { [K in Name]?: Partial<T> };
type Body<T> = [T] extends [undefined] ? { body?: never } : { body: T };

export type CallParts<E extends Endpoint> = Part<'params', ParamsOf<E>> & Optional<'query', QueryOf<E>> & Body<BodyInputOf<E>> & { signal?: AbortSignal };

const fill = (path: string, params: Record<string, unknown>) => path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params[name])));

function search(query: Record<string, unknown>): string {
  const pairs = Object.entries(query).flatMap(([name, value]) => (value === undefined ? [] : [[name, String(value)]]));
  return pairs.length > 0 ? `?${new URLSearchParams(pairs).toString()}` : '';
}

/** The address of an operation, for links that the browser opens itself (a label file). */
export function addressOf<E extends Endpoint>({ path }: Route<E>, params: ParamsOf<E>): string {
  return fill(path, params as Record<string, unknown>);
}

async function send(address: string, init: RequestInit): Promise<Response> {
  let response: Response;
  try {
    response = await fetch(address, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw noAnswer();
  }
  if (!response.ok) throw await problemFrom(response);
  return response;
}

/**
 * Calls one operation of the API.
 * @throws ApiProblem when the answer is not a success, or none came
 */
export async function call<E extends Endpoint>({ method, path }: Route<E>, parts: CallParts<E>): Promise<AnswerOf<E>> {
  const { params = {}, query = {}, body, signal } = parts as { params?: Record<string, unknown>; query?: Record<string, unknown>; body?: unknown; signal?: AbortSignal };
  const response = await send(fill(path, params) + search(query), {
    method: method.toUpperCase(),
    headers: { Accept: 'application/json', ...(body === undefined ? {} : { 'Content-Type': 'application/json' }) },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    ...(signal ? { signal } : {}),
  });
  const text = await response.text();
  return (text === '' ? undefined : JSON.parse(text)) as AnswerOf<E>;
}

/** Sends one file as the form field `file`. */
export async function upload<E extends Endpoint>({ method, path }: Route<E>, parts: { params: ParamsOf<E>; file: File }): Promise<AnswerOf<E>> {
  const form = new FormData();
  form.append('file', parts.file);
  const response = await send(fill(path, parts.params as Record<string, unknown>), { method: method.toUpperCase(), body: form });
  return (await response.json()) as AnswerOf<E>;
}
