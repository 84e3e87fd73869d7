import { z } from 'zod';
import type { Action } from './actions';

/**
 * Who may call: a member of the workspace with an action; any signed-in person; or anybody (links that carry a
 * secret, health checks). The door of `perform` holds it.
 */
export type Access = { scope: 'workspace'; action: Action } | { scope: 'person' } | { scope: 'public' };

/** What a file answer is made of; its contract says which content type it has. */
export interface FileAnswer {
  body: string | Uint8Array<ArrayBuffer> | ReadableStream<Uint8Array>;
  contentType: string;
  fileName: string;
  /** Shown in the page rather than saved. */
  inline?: boolean;
  /** Seconds that the person's own browser may keep it. */
  keepSeconds?: number;
}
export const fileAnswer = z.custom<FileAnswer>(
  (value) => typeof value === 'object' && value !== null && 'contentType' in value,
);

export interface Contract<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  /** Unique name such as "animals.list"; key of the client's cache and operation id of the OpenAPI document. */
  id: string;
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Path under /api/v1 with parameters in braces. */
  path: string;
  summary: string;
  access: Access;
  params: Params;
  query: Query;
  body: Body;
  response: Response;
  /** The write needs an `Idempotency-Key` header; a repeat of the same request gives the first answer again. */
  idempotent: boolean;
  /** How the body comes in; a form carries files. */
  consumes: 'application/json' | 'multipart/form-data';
  /** Content type of a file answer; null for JSON. */
  produces: string | null;
}

export type Input<C extends Contract> = {
  params: z.output<C['params']>;
  query: z.output<C['query']>;
  body: z.output<C['body']>;
};
export type Answer<C extends Contract> = z.output<C['response']>;

type Nothing = Record<never, never>;
type Optional<Key extends string, T> = undefined extends T
  ? { [K in Key]?: T }
  : Nothing extends T
    ? { [K in Key]?: T }
    : { [K in Key]: T };
/** What a caller hands over: parts that may be empty can be left out. */
export type Request<C extends Contract> = Optional<'params', z.input<C['params']>> &
  Optional<'query', z.input<C['query']>> &
  Optional<'body', z.input<C['body']>>;

const nothing = z.object({});
export const workspaceSlug = z.string().regex(/^[a-z0-9][a-z0-9-]{1,48}$/);
export const inWorkspace = z.object({ workspace: workspaceSlug });

interface Given<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType> {
  id: string;
  method: Contract['method'];
  path: string;
  summary: string;
  access: Access;
  params?: P;
  query?: Q;
  body?: B;
  response: R;
  idempotent?: boolean;
  consumes?: Contract['consumes'];
  produces?: string;
}

/** Declares what crosses the wire for one thing that a person can do. */
export function contract<
  R extends z.ZodType,
  P extends z.ZodType = typeof inWorkspace,
  Q extends z.ZodType = typeof nothing,
  B extends z.ZodType = z.ZodUndefined,
>(given: Given<P, Q, B, R>): Contract<P, Q, B, R> {
  return {
    ...given,
    params: given.params ?? ((given.access.scope === 'workspace' ? inWorkspace : nothing) as unknown as P),
    query: given.query ?? (nothing as unknown as Q),
    body: given.body ?? (z.undefined() as unknown as B),
    idempotent: given.idempotent ?? false,
    consumes: given.consumes ?? 'application/json',
    produces: given.produces ?? null,
  };
}

/** A page of a list: how many rows to skip and to give. */
export const pageQuery = {
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(500).default(100),
};

/** A list with the count of all rows that match. */
export const pageOf = <Row extends z.ZodType>(row: Row) =>
  z.object({ rows: z.array(row), total: z.int().min(0) });

export const isoDay = z.iso.date();
/** An instant as ISO 8601 text on the wire. */
export const instant = z.iso.datetime({ offset: true });
/** Integer minor units of the workspace's currency, in JavaScript's safe range. */
export const minorUnits = z.int();
export const done = z.object({ done: z.literal(true) });
