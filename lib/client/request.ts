import type { Answer, Contract, Request } from '@/lib/contracts/contract';
import { problem, type Problem } from '@/lib/contracts/problem';

/** What the server refused, or what kept it from answering, as a thing to show. */
export class RequestError extends Error {
  override name = 'RequestError';
  constructor(readonly problem: Problem) {
    super(problem.detail);
  }
  /** The message for a field of a form, if it was wrong. */
  messageFor(field: string): string | undefined {
    return this.problem.errors.find((error) => error.field === field)?.message;
  }
}

const unreachable: Problem = {
  type: '/problems/unreachable',
  title: 'No connection',
  status: 0,
  detail:
    'The server could not be reached. What you entered is still here and has not been saved; try again when you are connected.',
  errors: [],
};

/** The address of a contract for these parameters, also for links to files and pictures. */
export function addressOf<C extends Contract>(contract: C, input: Request<C>): string {
  const { params = {}, query = {} } = input as {
    params?: Record<string, string>;
    query?: Record<string, unknown>;
  };
  const path = contract.path.replace(/\{(\w+)\}/g, (_, name: string) =>
    encodeURIComponent(params[name] ?? ''),
  );
  const search = new URLSearchParams(
    Object.entries(query).flatMap(([key, value]) =>
      value === undefined || value === '' ? [] : [[key, String(value)]],
    ),
  ).toString();
  return `/api/v1${path}${search ? `?${search}` : ''}`;
}

/**
 * Calls the route of a contract.
 * @throws {RequestError} with the problem document, also when the server can't be reached
 */
export async function request<C extends Contract>(
  contract: C,
  input: Request<C>,
  options: { idempotencyKey?: string; signal?: AbortSignal } = {},
): Promise<Answer<C>> {
  const { body } = input as { body?: unknown };
  const isForm = contract.consumes === 'multipart/form-data';
  const response = await fetch(addressOf(contract, input), {
    method: contract.method,
    headers: {
      ...(body !== undefined && !isForm ? { 'content-type': 'application/json' } : {}),
      ...(options.idempotencyKey ? { 'idempotency-key': options.idempotencyKey } : {}),
    },
    body:
      body === undefined
        ? undefined
        : isForm
          ? formOf(body as Record<string, unknown>)
          : JSON.stringify(body),
    signal: options.signal,
  }).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new RequestError(unreachable);
  });
  const answer: unknown = await response.json().catch(() => null);
  if (response.ok) return answer as Answer<C>;
  const parsed = problem.safeParse(answer);
  throw new RequestError(
    parsed.success ? parsed.data : { ...unreachable, title: 'No answer', status: response.status },
  );
}

function formOf(fields: Record<string, unknown>): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) {
    if (value !== undefined) form.append(name, value instanceof Blob ? value : String(value));
  }
  return form;
}
