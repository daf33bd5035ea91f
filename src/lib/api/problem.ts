import type { Problem } from '../../../shared/api/common.ts';

export type FieldProblem = { path: string; message: string };

/** What went wrong with a call, as RFC 9457 problem details; status 0 when no answer came at all. */
export class ApiProblem extends Error {
  readonly status: number;
  readonly title: string;
  /** Each wrong entry with the path of its field. */
  readonly problems: readonly FieldProblem[];

  constructor(problem: Pick<Problem, 'status' | 'title' | 'detail' | 'problems'>) {
    super(problem.detail ?? problem.title);
    this.name = 'ApiProblem';
    this.status = problem.status;
    this.title = problem.title;
    this.problems = problem.problems ?? [];
  }
}

/** The call never reached the server: no signal, or the server is down. */
export function noAnswer(): ApiProblem {
  return new ApiProblem({ status: 0, title: 'No connection', detail: 'Dawnvane cannot be reached. Check the signal and try again; nothing you typed is lost.' });
}

const isText = (value: unknown): value is string => typeof value === 'string';
const isFieldProblem = (value: unknown): value is FieldProblem => typeof value === 'object' && value !== null && isText((value as FieldProblem).path) && isText((value as FieldProblem).message);

/** Reads problem JSON; an answer of another kind (a proxy's page) becomes a plain sentence. */
export async function problemFrom(response: Response): Promise<ApiProblem> {
  const fallback = { status: response.status, title: 'Something went wrong', detail: `The server answered with status ${response.status}. Try again in a moment.` };
  try {
    const body: unknown = await response.json();
    if (typeof body !== 'object' || body === null) return new ApiProblem(fallback);
    const { title, detail, problems } = body as Record<string, unknown>;
    return new ApiProblem({
      status: response.status,
      title: isText(title) ? title : fallback.title,
      detail: isText(detail) ? detail : isText(title) ? title : fallback.detail,
      ...(Array.isArray(problems) ? { problems: problems.filter(isFieldProblem) } : {}),
    });
  } catch {
    return new ApiProblem(fallback);
  }
}

export const isApiProblem = (error: unknown, status?: number): error is ApiProblem => error instanceof ApiProblem && (status === undefined || error.status === status);
