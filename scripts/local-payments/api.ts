import type { IncomingHttpHeaders } from 'node:http';
import { setTimeout as sleep } from 'node:timers/promises';
import { ApiError } from './api-error';
import { expand } from './expand';
import { canonicalText, parseForm, type FormTree } from './form';
import { Parameters } from './parameters';
import { findRoute } from './routes';
import type { Runtime } from './runtime';
import type { Fault } from './state';
import { newId } from './world';

export interface ApiCall {
  method: string;
  path: string;
  query: string;
  headers: IncomingHttpHeaders;
  body: string;
}

export interface ApiAnswer {
  status: number;
  headers: Record<string, string>;
  body: string;
}

/** Keys of calls that are being worked on. */
export type InFlight = Set<string>;

/** @returns the secret key, which stands for the account */
function authenticate(header: string | undefined): string {
  const [scheme = '', given = ''] = (header ?? '').split(' ');
  const key = scheme === 'Basic' ? Buffer.from(given, 'base64').toString().split(':')[0] : given;
  const problem =
    key === undefined || key === ''
      ? 'You did not provide an API key.'
      : /^(sk|rk)_test_\w+$/.test(key)
        ? null
        : 'Invalid API Key provided: this local server takes test keys only (sk_test_…).';
  if (problem !== null || key === undefined) {
    throw new ApiError(401, { type: 'invalid_request_error', message: problem ?? '' });
  }
  return key;
}

function takeFault(runtime: Runtime, call: ApiCall, when: Fault['when']): Fault['kind'] | null {
  const { state } = runtime.world;
  const fault = state.faults.find(
    (candidate) => candidate.when === when && call.path.startsWith(candidate.path),
  );
  if (fault === undefined) return null;
  fault.times -= 1;
  state.faults = state.faults.filter((candidate) => candidate.times > 0);
  return fault.kind;
}

/** Says that the connection is to be closed without an answer. */
export class DroppedAnswer extends Error {}

function meetFault(runtime: Runtime, call: ApiCall, when: Fault['when']): void {
  const kind = takeFault(runtime, call, when);
  if (kind === 'drop') throw new DroppedAnswer();
  if (kind === 'rate-limit') {
    throw new ApiError(429, {
      type: 'invalid_request_error',
      code: 'rate_limit',
      message: 'Too many requests.',
    });
  }
  if (kind === 'error') {
    // A failure after the work began is kept for its key: repeating the call would only repeat the answer.
    const headers = when === 'after' ? { 'stripe-should-retry': 'false' } : undefined;
    throw new ApiError(
      500,
      { type: 'api_error', message: 'Something went wrong here.' },
      when === 'after',
      headers,
    );
  }
}

function answerOf(error: unknown): {
  status: number;
  body: string;
  hasExecuted: boolean;
  headers: Record<string, string>;
} {
  if (error instanceof ApiError) {
    const body = JSON.stringify({ error: error.body }, null, 2);
    return { status: error.status, body, hasExecuted: error.hasExecuted, headers: { ...error.headers } };
  }
  console.error(error);
  const body = JSON.stringify({
    error: { type: 'api_error', message: 'The local server failed; see its log.' },
  });
  return { status: 500, body, hasExecuted: true, headers: {} };
}

function run(runtime: Runtime, call: ApiCall, tree: FormTree): string {
  const { handler, id } = findRoute(call.method, call.path);
  const parameters = new Parameters(tree);
  const paths = parameters.texts('expand');
  const result = handler(runtime.world, parameters, id);
  return JSON.stringify(expand(runtime.world, result, paths), null, 2);
}

function findKept(
  runtime: Runtime,
  name: string,
  fingerprint: string,
  headers: Record<string, string>,
): ApiAnswer | null {
  const kept = runtime.world.state.answers[name];
  if (kept === undefined) return null;
  if (kept.fingerprint !== fingerprint) {
    throw new ApiError(400, {
      type: 'idempotency_error',
      message:
        'Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than the one of this request if you meant to execute a different request.',
    });
  }
  const replayed = { ...headers, 'idempotent-replayed': 'true', 'original-request': kept.requestId };
  if (kept.status >= 500) Object.assign(replayed, { 'stripe-should-retry': 'false' });
  return { status: kept.status, headers: replayed, body: kept.body };
}

/** Answers one call under /v1. */
export async function answerApi(runtime: Runtime, inFlight: InFlight, call: ApiCall): Promise<ApiAnswer> {
  const { world } = runtime;
  const requestId = newId('req');
  const version = String(call.headers['stripe-version'] ?? world.settings.apiVersion);
  const headers: Record<string, string> = { 'request-id': requestId, 'stripe-version': version };
  let claimed: string | null = null;
  try {
    const account = authenticate(call.headers.authorization);
    meetFault(runtime, call, 'before');
    // First what became due: keys older than a day are forgotten by it.
    runtime.refresh();
    const key = call.method === 'POST' ? (call.headers['idempotency-key']?.toString() ?? null) : null;
    if (key !== null && key.length > 255) {
      throw new ApiError(400, {
        type: 'invalid_request_error',
        message: 'Idempotency keys have at most 255 characters.',
      });
    }
    const tree = parseForm(call.method === 'POST' ? call.body : call.query);
    const name = key === null ? null : `${account} ${key}`;
    const fingerprint = `${call.method} ${call.path} ${canonicalText(tree)}`;
    if (name !== null && key !== null) {
      headers['idempotency-key'] = key;
      if (inFlight.has(name)) {
        throw new ApiError(409, {
          type: 'idempotency_error',
          code: 'idempotency_key_in_use',
          message: 'There is currently another in-progress request using this Idempotent Key.',
        });
      }
      const kept = findKept(runtime, name, fingerprint, headers);
      if (kept !== null) return kept;
      inFlight.add(name);
      claimed = name;
    }
    if (world.settings.latency > 0) await sleep(world.settings.latency);
    runtime.refresh();
    world.request = { id: requestId, idempotency_key: key };
    return await execute(runtime, call, tree, { name, fingerprint, headers, requestId });
  } catch (error) {
    if (error instanceof DroppedAnswer) throw error;
    const { status, body, headers: more } = answerOf(error);
    return { status, headers: { ...headers, ...more }, body };
  } finally {
    if (claimed !== null) inFlight.delete(claimed);
  }
}

async function execute(
  runtime: Runtime,
  call: ApiCall,
  tree: FormTree,
  about: { name: string | null; fingerprint: string; headers: Record<string, string>; requestId: string },
): Promise<ApiAnswer> {
  const { world } = runtime;
  let answer: { status: number; body: string; hasExecuted: boolean; headers: Record<string, string> };
  try {
    answer = { status: 200, body: run(runtime, call, tree), hasExecuted: true, headers: {} };
  } catch (error) {
    answer = answerOf(error);
  }
  let isDropped = false;
  if (answer.hasExecuted) {
    try {
      meetFault(runtime, call, 'after');
    } catch (error) {
      if (error instanceof DroppedAnswer) isDropped = true;
      else answer = answerOf(error);
    }
  }
  if (about.name !== null && answer.hasExecuted) {
    const { fingerprint, requestId } = about;
    world.state.answers[about.name] = {
      fingerprint,
      status: answer.status,
      body: answer.body,
      requestId,
      at: world.now(),
    };
  }
  if (call.method !== 'GET') {
    runtime.commit();
    if (world.settings.deliversBeforeAnswer) await runtime.deliverer.settle();
  }
  if (isDropped) throw new DroppedAnswer();
  return { status: answer.status, headers: { ...about.headers, ...answer.headers }, body: answer.body };
}
