import 'server-only';
import { createHash } from 'node:crypto';
import type { ZodError, ZodType } from 'zod';
import { enterWorkspace, withScope, type Transaction } from '@/db/scope';
import { findAnswer, keepAnswer, reserveKey } from '@/db/queries/idempotency';
import type { Answer, Contract, Input } from '@/lib/contracts/contract';
import { dayIn, readClock } from '@/lib/services/clock';
import { openServices } from '@/lib/services/open-services';
import { takeAfterCommit } from './after-commit';
import { translateDatabaseError } from './database-errors';
import { reachOf } from './permissions';
import { notFound, Refusal, type FieldError } from './refusal';
import type { Person, UseCase, WorkspaceWorld } from './world';

export interface Caller {
  /** Signed in, with a verified address; null for a visitor. */
  person: Person | null;
  /** From the `Idempotency-Key` header. */
  idempotencyKey?: string;
}

/** What came in: parameters and query as text or values, the body read only once the caller has been let in. */
export interface RawInput {
  params?: unknown;
  query?: unknown;
  body?: unknown;
  readBody?: () => Promise<unknown>;
}

/**
 * Runs a use case for routes, pages, jobs, seeds and tests: who is asking, may they, what do they ask, then the work
 * in one transaction, and the answer checked against its contract. Membership is proven before anything is parsed,
 * so that a stranger learns nothing, not even that a field was wrong.
 * @throws {Refusal} for everything that a person can cause
 */
export async function perform<C extends Contract>(
  useCase: UseCase<C>,
  caller: Caller,
  raw: RawInput,
): Promise<Answer<C>> {
  const now = readClock();
  const services = openServices();
  const { contract } = useCase;

  const run = async (): Promise<{ answer: Answer<C>; later: (() => Promise<void>)[] }> => {
    if (useCase.scope === 'public') {
      return withScope({}, async (tx) => {
        const input = await parseInput(contract, raw);
        const answer = await useCase.run({ tx, now, services, person: caller.person }, input);
        return { answer, later: takeAfterCommit(tx) };
      });
    }
    const person = caller.person;
    if (!person) throw new Refusal('signed_out', 'Sign in first.');
    if (useCase.scope === 'person') {
      return withScope({ userId: person.userId }, async (tx) => {
        const input = await parseInput(contract, raw);
        const answer = await useCase.run({ tx, now, services, person }, input);
        return { answer, later: takeAfterCommit(tx) };
      });
    }
    return withScope({ userId: person.userId }, async (tx) => {
      const world = await enter(tx, contract, person, raw, { now, services });
      const input = await parseInput(contract, raw);
      const answer = contract.idempotent
        ? await once(world, contract, caller.idempotencyKey, input, () => useCase.run(world, input))
        : await useCase.run(world, input);
      return { answer, later: takeAfterCommit(tx) };
    });
  };

  const { answer, later } = await run().catch((error: unknown) => {
    throw translateDatabaseError(error);
  });
  for (const work of later) await work();
  return contract.response.parse(answer) as Answer<C>;
}

/** Proves membership and permission, and furnishes the world of a workspace use case. */
async function enter(
  tx: Transaction,
  contract: Contract,
  person: Person,
  raw: RawInput,
  base: Pick<WorkspaceWorld, 'now' | 'services'>,
): Promise<WorkspaceWorld> {
  const slug = (raw.params as { workspace?: unknown } | undefined)?.workspace;
  const membership = typeof slug === 'string' ? await enterWorkspace(tx, slug, person.userId) : null;
  if (!membership || contract.access.scope !== 'workspace') throw notFound('workspace');
  const reach = reachOf(membership.role, contract.access.action);
  if (reach === 'no') throw new Refusal('not_allowed', 'Your role in this workspace does not include this.');
  const { workspace, memberId, role, partyId, projectIds } = membership;
  return {
    ...base,
    tx,
    workspace,
    today: dayIn(workspace.timeZone, base.now),
    actor: { ...person, memberId, role, partyId, projectIds },
    sees: reach === 'all' ? { everything: true } : { everything: false, partyId, projectIds },
  };
}

async function parseInput<C extends Contract>(contract: C, raw: RawInput): Promise<Input<C>> {
  // An identifier that is none names nothing: that is "not found", not a wrong field.
  const params = contract.params.safeParse(raw.params ?? {});
  if (!params.success) throw notFound('page');
  const query = parsePart(contract.query, raw.query ?? {});
  const body = parsePart(contract.body, raw.readBody ? await raw.readBody() : raw.body);
  return { params: params.data, query, body } as Input<C>;
}

function parsePart(schema: ZodType, value: unknown): unknown {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors = fieldErrors(parsed.error);
  throw new Refusal('invalid', errors[0]?.message ?? 'Something in the request is not right.', { errors });
}

function fieldErrors(error: ZodError): FieldError[] {
  return error.issues.map((issue) => ({ field: issue.path.join('.'), message: issue.message }));
}

/** Does a write once per key: a repeat of the same request gets the first answer, another request is refused. */
async function once<C extends Contract>(
  { tx, workspace }: WorkspaceWorld,
  contract: C,
  key: string | undefined,
  input: Input<C>,
  work: () => Promise<Answer<C>>,
): Promise<Answer<C>> {
  if (!key)
    throw new Refusal(
      'key_missing',
      'This request needs an Idempotency-Key header, made new for each intention.',
    );
  const inputHash = createHash('sha256')
    .update(JSON.stringify([contract.id, input]))
    .digest('hex');
  const isFirst = await reserveKey(tx, { workspaceId: workspace.id, key, useCase: contract.id, inputHash });
  if (!isFirst) {
    const kept = await findAnswer(tx, key);
    if (!kept || kept.inputHash !== inputHash) {
      throw new Refusal('key_reused', 'This Idempotency-Key was used for another request.');
    }
    return kept.response as Answer<C>;
  }
  const answer = await work();
  await keepAnswer(tx, key, answer);
  return answer;
}
