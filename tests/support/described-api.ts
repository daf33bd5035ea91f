import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { allEndpoints } from '../../shared/api/index.ts';
import type { Browser } from './people.ts';

interface Described {
  responses: Record<string, { content?: Record<string, object> }>;
}
export interface ApiDescription {
  openapi: string;
  paths: Record<string, Record<string, Described & { operationId: string }>>;
}

export interface Answer {
  status: number;
  body: Record<string, unknown>;
}
interface Ask {
  params?: Record<string, string>;
  query?: string;
  send?: object | string;
  file?: Buffer;
  headers?: Record<string, string>;
}

const pointer = (part: string): string => part.replace(/~/g, '~0').replace(/\//g, '~1');

/** Calls operations by their id and holds every answer against the published description. */
export class DescribedApi {
  /** By operation: the statuses that came, where an answer is not as described, and the bodies of success. */
  readonly outcomes = new Map<string, { statuses: number[]; unlike: string[]; successes: Record<string, unknown>[] }>();
  readonly #ajv: Ajv2020;
  readonly #description: ApiDescription;

  constructor(description: ApiDescription) {
    this.#description = description;
    this.#ajv = new Ajv2020({ strict: false, allErrors: true });
    addFormats.default(this.#ajv);
    this.#ajv.addSchema(description, 'api');
  }

  /** Checks a value against a schema of the description, by its place in it. */
  validatorAt(...place: string[]): ValidateFunction {
    return this.#ajv.compile({ $ref: `api#/${place.map((part) => encodeURIComponent(pointer(part))).join('/')}` });
  }

  async call(id: string, browser: Browser, { params = {}, query = '', send, file, headers = {} }: Ask = {}): Promise<Answer> {
    const endpoint = allEndpoints.find((one) => one.id === id);
    if (!endpoint) throw new Error(`No operation ${id}`);
    const address = endpoint.path.replace(/:(\w+)/g, (_all, name: string) => params[name] ?? `no-${name}`) + query;
    const request = browser[endpoint.method](address).set(headers);
    const answer = await (file ? request.attach('file', file, 'label.pdf') : request.send(send));
    const contentType = String(answer.headers['content-type'] ?? '').split(';')[0]!;
    const outcome = this.outcomes.get(id) ?? { statuses: [], unlike: [], successes: [] };
    this.outcomes.set(id, outcome);
    outcome.statuses.push(answer.status);
    if (answer.ok) outcome.successes.push(answer.body as Record<string, unknown>);
    outcome.unlike.push(...this.#unlike(endpoint, answer.status, contentType, contentType.endsWith('json') ? JSON.parse(answer.text) : undefined));
    return { status: answer.status, body: answer.body as Record<string, unknown> };
  }

  #unlike(endpoint: Endpoint, status: number, contentType: string, body: unknown): string[] {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    const { responses } = this.#description.paths[path]![endpoint.method]!;
    const key = responses[status] ? String(status) : 'default';
    if (key === 'default' && status < 400) return [`a success ${status} that is not described`];
    const content = responses[key]!.content ?? {};
    if (Object.keys(content).length === 0) return contentType ? [`${status} has a body of ${contentType}, none is described`] : [];
    if (!content[contentType]) return [`${status} is ${contentType || 'empty'}, described is ${Object.keys(content).join(', ')}`];
    if (!contentType.endsWith('json')) return [];
    const validate = this.validatorAt('paths', path, endpoint.method, 'responses', key, 'content', contentType, 'schema');
    return validate(body) ? [] : (validate.errors ?? []).map((error) => `${status} ${error.instancePath} ${error.message} ${JSON.stringify(error.params)}`);
  }
}
