import { z } from 'zod';
import { conflictSchema, problemSchema } from '../../shared/api/common.ts';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { allEndpoints } from '../../shared/api/index.ts';
import { inboundForecastSchema } from '../../shared/api/inbound-forecast.ts';
import { noticeEventSchema } from '../../shared/api/notice-event.ts';
import { SchemaBook, type Json } from './openapi-schemas.ts';

const takesNothing = (schema: z.ZodType): boolean => schema instanceof z.ZodUndefined || (schema instanceof z.ZodObject && Object.keys(schema.shape).length === 0);

/** Headers of a signed message, as Standard Webhooks 1.0.0 names them. */
const signatureHeaders: Json[] = [
  ['webhook-id', 'Names the message; the same at every try.'],
  ['webhook-timestamp', 'When this try was signed: whole seconds since 1970.'],
  ['webhook-signature', 'One or more `v1,` signatures, apart by spaces.'],
].map(([name, description]) => ({ name, in: 'header', required: true, description, schema: { type: 'string' } }));

function parameters({ params, query, access }: Endpoint, book: SchemaBook): Json[] {
  const rows = (schema: z.ZodType, place: 'path' | 'query'): Json[] =>
    schema instanceof z.ZodObject
      ? Object.entries(schema.shape as Record<string, z.ZodType>).map(([name, part]) => ({ name, in: place, required: place === 'path' || !part.safeParse(undefined).success, schema: book.of(part, 'input') }))
      : [];
  return [...rows(params, 'path'), ...rows(query, 'query'), ...(access === 'signature' ? signatureHeaders : [])];
}

function requestBody({ bodyKind, body, access }: Endpoint, book: SchemaBook): Json | null {
  if (bodyKind === 'multipart') return { required: true, content: { 'multipart/form-data': { schema: { type: 'object', required: ['file'], properties: { file: { type: 'string', contentMediaType: 'application/octet-stream' } } } } } };
  const schema = access === 'signature' ? inboundForecastSchema : body;
  return takesNothing(schema) ? null : { required: true, content: { 'application/json': { schema: book.of(schema, 'input') } } };
}

/** How an operation may fail, from what it takes and who may call it. */
function failures(endpoint: Endpoint, book: SchemaBook): Json {
  const { access, bodyKind, rateLimit, method, body } = endpoint;
  const problem = (description: string, schema: z.ZodType = problemSchema): Json => ({ description, content: { 'application/problem+json': { schema: book.of(schema, 'output') } } });
  const needsSession = access === 'signedIn' || typeof access === 'object';
  const takesBody = bodyKind !== undefined || !takesNothing(body);
  const isEdit = body instanceof z.ZodObject && 'version' in body.shape;
  return {
    ...(takesBody ? { 400: problem('The body is not understood.'), 413: problem('The body is too large.'), 415: problem('The body is of another kind than is read here.') } : {}),
    ...(needsSession ? { 401: problem('Nobody is signed in.') } : {}),
    ...(access === 'signature' ? { 401: problem('Sender, signature or date do not hold.') } : {}),
    ...(typeof access === 'object' || method !== 'get' ? { 403: problem('The role of the caller does not allow it, or the request comes from another site.') } : {}),
    404: problem('Nothing of that name, or not for the caller.'),
    ...(isEdit ? { 409: problem('Someone else changed it since the version that the edit was made from.', conflictSchema) } : {}),
    422: problem('Entries need another look; each is named by its path.'),
    ...(rateLimit ? { 429: problem('Too many tries; the header Retry-After tells how long to wait.') } : {}),
    default: problem('Anything else.'),
  };
}

function success({ answer, answerKind, status }: Endpoint, book: SchemaBook): Json {
  if (answerKind) return { description: 'Success.', content: { [answerKind]: { schema: { type: 'string', contentMediaType: answerKind } } } };
  return answer instanceof z.ZodUndefined || status === 204 ? { description: 'Success; nothing to tell.' } : { description: 'Success.', content: { 'application/json': { schema: book.of(answer, 'output') } } };
}

function operation(endpoint: Endpoint, book: SchemaBook): Json {
  const { id, summary, access, rateLimit, status } = endpoint;
  const body = requestBody(endpoint, book);
  return {
    operationId: id,
    summary,
    ...(typeof access === 'object' ? { tags: [access.resource], 'x-right': `${access.action} ${access.resource}` } : { tags: [access] }),
    ...(rateLimit ? { 'x-rate-limited': rateLimit } : {}),
    security: access === 'signedIn' || typeof access === 'object' ? [{ session: [] }] : [],
    parameters: parameters(endpoint, book),
    ...(body ? { requestBody: body } : {}),
    responses: { [status]: success(endpoint, book), ...failures(endpoint, book) },
  };
}

/** The whole API as OpenAPI 3.1, made from the same schemas that check the requests. */
export function openApiDocument(version: string): Json {
  const book = new SchemaBook();
  const paths: Record<string, Json> = {};
  for (const endpoint of allEndpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method]: operation(endpoint, book) };
  }
  const event = {
    operationId: 'noticeEvent',
    summary: 'A notice of the farm, sent to its outgoing webhooks at least once; the same webhook-id is the same event.',
    parameters: signatureHeaders,
    requestBody: { required: true, content: { 'application/json': { schema: book.of(noticeEventSchema, 'output') } } },
    responses: { '2XX': { description: 'Taken.' }, 410: { description: 'Send no more: the webhook is switched off.' }, default: { description: 'Tried again later.' } },
  };
  return {
    openapi: '3.1.0',
    info: {
      title: 'Dawnvane',
      version,
      description:
        'Whether a morning is fit for spraying, and the notices about it. The label is the law; local rules and a licensed applicator come first; a reading on site beats any forecast.\n\nWhatever changes something must carry an Origin header of the pages themselves, but for signed messages.',
    },
    servers: [{ url: '/' }],
    paths,
    webhooks: { notice: { post: event } },
    components: {
      schemas: book.schemas,
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'dawnvane_session' } },
    },
  };
}
