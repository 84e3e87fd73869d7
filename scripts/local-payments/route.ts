import type { Parameters } from './parameters';
import type { World } from './world';

/**
 * Does the work of one call: reads every parameter, calls `finish`, then acts.
 * @param id the id in the path; empty where there is none
 */
export type Handler = (world: World, parameters: Parameters, id: string) => unknown;

/** `POST /v1/refunds` → handler; `:id` stands for an id. */
export type Routes = Readonly<Record<string, Handler>>;
