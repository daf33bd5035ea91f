import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { Logger } from 'pino';
import type { z } from 'zod';
import type { Problem } from '../../shared/api/common.ts';

export type ProblemItem = { path: string; message: string };

const titles: Record<number, string> = {
  400: 'The request is not understood',
  401: 'Sign in first',
  403: 'Your role does not allow this',
  404: 'Not found',
  409: 'Changed by someone else meanwhile',
  410: 'No longer valid',
  413: 'Too large',
  415: 'Wrong kind of content',
  422: 'Some entries need another look',
  429: 'Too many tries',
  503: 'Not available just now',
};

/** An answer that is not a success, told as RFC 9457 problem details. Thrown by handlers, sent by `problemHandler`. */
export class HttpProblem extends Error {
  readonly status: number;
  readonly problems: ProblemItem[] | undefined;
  readonly extra: Record<string, unknown>;
  readonly headers: Record<string, string>;

  /** @param detail what is wrong and what to do, for a person @param problems each with the path of its field */
  constructor(status: number, detail: string, problems?: ProblemItem[], extra: Record<string, unknown> = {}, headers: Record<string, string> = {}) {
    super(detail);
    this.status = status;
    this.problems = problems;
    this.extra = extra;
    this.headers = headers;
  }
}

export const notFound = (what = 'Nothing of that name here, or not for you.'): HttpProblem => new HttpProblem(404, what);
export const invalid = (problems: ProblemItem[]): HttpProblem => new HttpProblem(422, 'Correct the entries named below and send again; nothing was changed.', problems);

/** Zod's issues as paths (`hours.3.windSpeed10mMs`) and sentences. */
export const problemsOf = (error: z.ZodError): ProblemItem[] => error.issues.map((issue) => ({ path: issue.path.map(String).join('.'), message: issue.message }));

/** Answers addresses that no operation has. */
export const noSuchOperation: RequestHandler = (request) => {
  throw new HttpProblem(404, `No operation ${request.method} ${request.path}; see /api/openapi.json.`);
};

function known(error: unknown): HttpProblem | null {
  if (error instanceof HttpProblem) return error;
  if (typeof error !== 'object' || error === null) return null;
  const { type, status, name, code } = error as { type?: string; status?: number; name?: string; code?: string };
  if (type === 'entity.parse.failed') return new HttpProblem(400, 'The body is not valid JSON.');
  if (type === 'entity.too.large' || code === 'LIMIT_FILE_SIZE') return new HttpProblem(413, 'The body is larger than is taken here.');
  if (type === 'encoding.unsupported' || type === 'charset.unsupported') return new HttpProblem(415, 'Send UTF-8 JSON.');
  if (name === 'MulterError') return new HttpProblem(422, 'Send one file in the field `file`.');
  if (name === 'SequelizeConnectionRefusedError' || name === 'SequelizeConnectionError' || name === 'SequelizeConnectionAcquireTimeoutError') {
    return new HttpProblem(503, 'The database does not answer; try again in a moment.', undefined, {}, { 'Retry-After': '5' });
  }
  return status !== undefined && status >= 400 && status < 500 ? new HttpProblem(status, 'The request is not understood.') : null;
}

/** Sends every error as problem JSON; what is unexpected is logged whole and told without its inside. */
export function problemHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const problem = known(error);
    if (!problem) log.error({ err: error, method: request.method, path: request.path }, 'request failed');
    const status = problem?.status ?? 500;
    const body: Problem & Record<string, unknown> = {
      type: 'about:blank',
      title: titles[status] ?? 'Something went wrong on our side',
      status,
      detail: problem?.message ?? 'The server met an error it did not expect; it is logged. Nothing of yours was lost.',
      instance: request.originalUrl.split('?')[0]!,
      ...(problem?.problems ? { problems: problem.problems } : {}),
      ...problem?.extra,
    };
    for (const [name, value] of Object.entries(problem?.headers ?? {})) response.setHeader(name, value);
    response.status(status).type('application/problem+json').send(JSON.stringify(body));
  };
}
