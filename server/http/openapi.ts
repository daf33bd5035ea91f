import { z } from 'zod';
import { problemSchema } from '../../shared/api/common.ts';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { allEndpoints } from '../../shared/api/index.ts';

type Json = Record<string, unknown>;

/** JSON Schema of what is read (`input`: before defaults) or sent (`output`). */
const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json;
  return rest;
};

const isEmpty = (schema: z.ZodType): boolean => schema instanceof z.ZodUndefined || (schema instanceof z.ZodObject && Object.keys(schema.shape).length === 0);

function parameters(endpoint: Endpoint): Json[] {
  const rows = (schema: z.ZodType, place: 'path' | 'query'): Json[] => {
    if (!(schema instanceof z.ZodObject)) return [];
    return Object.entries(schema.shape as Record<string, z.ZodType>).map(([name, part]) => ({ name, in: place, required: place === 'path' || !part.safeParse(undefined).success, schema: schemaOf(part, 'input') }));
  };
  return [...rows(endpoint.params, 'path'), ...rows(endpoint.query, 'query')];
}

function requestBody(endpoint: Endpoint): Json | undefined {
  if (endpoint.bodyKind === 'multipart') {
    return { required: true, content: { 'multipart/form-data': { schema: { type: 'object', required: ['file'], properties: { file: { type: 'string', contentMediaType: 'application/octet-stream' } } } } } };
  }
  if (endpoint.bodyKind === 'raw') return { required: true, content: { 'application/json': { schema: { type: 'object' } } } };
  return isEmpty(endpoint.body) ? undefined : { required: true, content: { 'application/json': { schema: schemaOf(endpoint.body, 'input') } } };
}

const problem = (description: string): Json => ({ description, content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } });

/** How an endpoint may fail, from what it takes and who may call it. */
function failures(endpoint: Endpoint): Json {
  const { access } = endpoint;
  const open = access === 'public' || access === 'demo' || access === 'signature';
  return {
    ...(open ? {} : { 401: problem('Nobody is signed in.') }),
    ...(access === 'signature' ? { 401: problem('The signature does not hold.') } : {}),
    ...(typeof access === 'object' ? { 403: problem('The role of the caller does not allow it.') } : {}),
    404: problem('Nothing of that name, or not for the caller.'),
    422: problem('Entries need another look; each is named by its path.'),
    ...(endpoint.rateLimit ? { 429: problem('Too many tries from one address.') } : {}),
    default: problem('Anything else.'),
  };
}

function success(endpoint: Endpoint): Json {
  if (endpoint.answerKind) return { description: 'Success.', content: { [endpoint.answerKind]: {} } };
  return isEmpty(endpoint.answer) && endpoint.status !== 200 ? { description: 'Success; nothing to tell.' } : { description: 'Success.', content: { 'application/json': { schema: schemaOf(endpoint.answer, 'output') } } };
}

/** The whole API as OpenAPI 3.1, made from the same schemas that check the requests. */
export function openApiDocument(version: string, webhooks: Json = {}): Json {
  const paths: Record<string, Json> = {};
  for (const endpoint of allEndpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    const body = requestBody(endpoint);
    paths[path] = {
      ...paths[path],
      [endpoint.method]: {
        operationId: endpoint.id,
        summary: endpoint.summary,
        ...(typeof endpoint.access === 'object' ? { 'x-right': `${endpoint.access.action} ${endpoint.access.resource}`, tags: [endpoint.access.resource] } : { tags: [endpoint.access] }),
        security: endpoint.access === 'signedIn' || typeof endpoint.access === 'object' ? [{ session: [] }] : [],
        parameters: parameters(endpoint),
        ...(body ? { requestBody: body } : {}),
        responses: { [endpoint.status]: success(endpoint), ...failures(endpoint) },
      },
    };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Dawnvane', version, description: 'Whether a morning is fit for spraying, and the notices about it. The label is the law; local rules and a licensed applicator come first; a reading on site beats any forecast.' },
    paths,
    webhooks,
    components: {
      schemas: { Problem: schemaOf(problemSchema, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'dawnvane_session' } },
    },
  };
}
