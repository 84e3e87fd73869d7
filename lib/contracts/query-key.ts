import type { Contract, Request } from './contract';

/** The key of an answer in the client's cache: the contract's name, then what was asked. Pages and hooks share it. */
export function queryKeyOf<C extends Contract>(contract: C, input: Request<C>): readonly unknown[] {
  const { params, query } = input as { params?: object; query?: object };
  return [contract.id, { ...params }, dropEmpty(query ?? {})];
}

function dropEmpty(values: object): object {
  return Object.fromEntries(
    Object.entries(values).filter(([, value]) => value !== undefined && value !== ''),
  );
}
