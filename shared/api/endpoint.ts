import { z } from 'zod';
import type { Action, Resource } from '../rules/authorization.ts';

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/**
 * Who may call: anyone; anyone signed in; a member whose role may do `action` on `resource` at the farm in `:farmId`;
 * a sender who signs the body; or anyone at all, but only while the fakes of the demo run.
 */
export type Access = 'public' | 'signedIn' | 'signature' | 'demo' | { resource: Resource; action: Action };

/** One operation of the HTTP API: the server registers it, the client calls it, OpenAPI describes it, the tests walk it. */
export interface Endpoint<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  A extends z.ZodType = z.ZodType,
> {
  id: string;
  method: Method;
  /** Express path, e.g. `/api/farms/:farmId/blocks/:id`. */
  path: string;
  summary: string;
  access: Access;
  /** `multipart`: a form with one file field named `file`; `raw`: the body is signed and read as bytes. */
  bodyKind?: 'json' | 'multipart' | 'raw';
  /** Media type of the answer when it is not JSON. */
  answerKind?: string;
  /** Which rate limit guards it. */
  rateLimit?: 'signIn' | 'mail';
  params: P;
  query: Q;
  body: B;
  answer: A;
  /** Status of success. */
  status: 200 | 201 | 202 | 204;
}

const nothing = z.object({});
/** The answer of an operation that answers nothing (204). */
export const empty = z.undefined();

type Parts<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, A extends z.ZodType> = Pick<
  Endpoint<P, Q, B, A>,
  'id' | 'method' | 'path' | 'summary' | 'access'
> &
  Partial<Pick<Endpoint<P, Q, B, A>, 'bodyKind' | 'answerKind' | 'rateLimit' | 'params' | 'query' | 'body' | 'answer' | 'status'>>;

/** Describes one operation; what is left out takes nothing and answers nothing. */
export function endpoint<
  P extends z.ZodType = typeof nothing,
  Q extends z.ZodType = typeof nothing,
  B extends z.ZodType = typeof empty,
  A extends z.ZodType = typeof empty,
>(parts: Parts<P, Q, B, A>): Endpoint<P, Q, B, A> {
  return {
    params: nothing as unknown as P,
    query: nothing as unknown as Q,
    body: empty as unknown as B,
    answer: empty as unknown as A,
    status: parts.answer ? 200 : 204,
    ...parts,
  };
}

export type ParamsOf<E extends Endpoint> = z.infer<E['params']>;
export type QueryOf<E extends Endpoint> = z.infer<E['query']>;
export type BodyOf<E extends Endpoint> = z.infer<E['body']>;
/** What a caller may send: defaults not yet filled in. */
export type BodyInputOf<E extends Endpoint> = z.input<E['body']>;
export type AnswerOf<E extends Endpoint> = z.infer<E['answer']>;
