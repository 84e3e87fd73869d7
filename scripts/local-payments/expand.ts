import { invalid } from './api-error';
import type { World } from './world';

const fields = new Set([
  'balance_transaction',
  'charge',
  'customer',
  'failure_balance_transaction',
  'latest_charge',
  'payment_intent',
  'source',
]);

function find(world: World, id: string): unknown {
  const { state } = world;
  const places = [
    state.charges,
    state.intents,
    state.balance,
    state.refunds,
    state.disputes,
    state.payouts,
    state.customers,
    state.sessions,
  ];
  for (const place of places) if (place[id] !== undefined) return structuredClone(place[id]);
  return undefined;
}

type Open = Record<string, unknown>;
const isOpen = (value: unknown): value is Open => typeof value === 'object' && value !== null;

/** Lists that are part of an object, but only shown on request. */
function innerList(world: World, object: Open, field: string): unknown {
  const id = String(object.id);
  const list = (data: unknown[], url: string) => ({ object: 'list', data, has_more: false, url });
  if (object.object === 'checkout.session' && field === 'line_items') {
    return list(structuredClone(world.state.lineItems[id] ?? []), `/v1/checkout/sessions/${id}/line_items`);
  }
  if (object.object === 'charge' && field === 'refunds') {
    const refunds = Object.values(world.state.refunds).filter((refund) => refund.charge === id);
    return list(structuredClone(refunds.reverse()), `/v1/charges/${id}/refunds`);
  }
  return undefined;
}

function expandPath(world: World, value: unknown, path: readonly string[], whole: string): void {
  const [field, ...rest] = path;
  if (field === undefined || value === null) return;
  if (Array.isArray(value)) {
    for (const item of value) expandPath(world, item, path, whole);
    return;
  }
  if (!isOpen(value)) throw invalid(`This property cannot be expanded (${whole}).`, 'expand');
  const inner = innerList(world, value, field);
  if (inner !== undefined) value[field] = inner;
  else if (field !== 'data' && !isOpen(value[field])) {
    if (!fields.has(field) || !(field in value)) {
      throw invalid(`This property cannot be expanded (${whole}).`, 'expand');
    }
    const id = value[field];
    if (typeof id === 'string') value[field] = find(world, id) ?? id;
  }
  expandPath(world, value[field] ?? null, rest, whole);
}

/** A copy of an answer in which the named ids are replaced by their objects; at most four levels deep. */
export function expand(world: World, answer: unknown, paths: readonly string[]): unknown {
  const copy: unknown = structuredClone(answer);
  for (const whole of paths) {
    const path = whole.split('.');
    if (path.length > 4) throw invalid('You cannot expand more than 4 levels of a property.', 'expand');
    expandPath(world, copy, path, whole);
  }
  return copy;
}
