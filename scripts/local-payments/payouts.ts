import type Stripe from 'stripe';
import { refused } from './api-error';
import { book, sumBalance } from './balance';
import { idOf } from './charges';
import { newId, type World } from './world';

export interface PayoutOptions {
  amount: number;
  currency: string;
  description: string | null;
  metadata: Record<string, string>;
  isAutomatic: boolean;
}

export function createPayout(world: World, options: PayoutOptions): Stripe.Payout {
  const sums = sumBalance(world).available.find((sum) => sum.currency === options.currency);
  if (options.amount > (sums?.amount ?? 0)) {
    throw refused(
      'You have insufficient funds in your account for this payout.',
      'balance_insufficient',
      'amount',
    );
  }
  const id = newId('po');
  const line = book(world, {
    type: 'payout',
    category: 'payout',
    amount: -options.amount,
    currency: options.currency,
    source: id,
    description: options.description ?? 'PAYOUT',
  });
  const payout: Stripe.Payout = {
    id,
    object: 'payout',
    amount: options.amount,
    application_fee: null,
    application_fee_amount: null,
    arrival_date: world.now() + world.settings.payoutAfter,
    automatic: options.isAutomatic,
    balance_transaction: line.id,
    created: world.now(),
    currency: options.currency,
    description: options.description,
    destination: null,
    failure_balance_transaction: null,
    failure_code: null,
    failure_message: null,
    livemode: false,
    metadata: options.metadata,
    method: 'standard',
    original_payout: null,
    payout_method: null,
    reconciliation_status: options.isAutomatic ? 'completed' : 'not_applicable',
    reversed_by: null,
    source_type: 'card',
    statement_descriptor: null,
    status: 'pending',
    trace_id: null,
    type: 'bank_account',
  };
  world.state.payouts[id] = payout;
  world.emit('payout.created', payout);
  world.schedule('pay-payout', id, world.settings.payoutAfter);
  return payout;
}

/**
 * Pays out everything that is available in a currency and remembers which lines that was.
 * @returns null when there is nothing to pay out
 */
export function payOutAvailable(world: World, currency: string): Stripe.Payout | null {
  const lines = Object.values(world.state.balance).filter(
    (line) =>
      line.currency === currency &&
      line.status === 'available' &&
      world.state.payoutOf[line.id] === undefined,
  );
  const amount = lines.reduce((sum, line) => sum + line.net, 0);
  if (amount <= 0) return null;
  const payout = createPayout(world, {
    amount,
    currency,
    description: null,
    metadata: {},
    isAutomatic: true,
  });
  for (const line of lines) world.state.payoutOf[line.id] = payout.id;
  world.state.payoutOf[idOf(payout.balance_transaction) ?? ''] = payout.id;
  return payout;
}

export function settlePayout(world: World, payout: Stripe.Payout): void {
  if (payout.status === 'failed' || payout.status === 'paid') return;
  world.change(payout, ['payout.paid'], (changed) => {
    changed.status = 'paid';
  });
}

/** The bank refuses the money; it comes back to the account. */
export function failPayout(world: World, payout: Stripe.Payout): void {
  if (payout.status === 'failed') throw refused(`Payout ${payout.id} has failed already.`);
  world.unschedule(payout.id, 'pay-payout');
  world.change(payout, ['payout.failed'], (changed) => {
    changed.status = 'failed';
    changed.failure_code = 'account_closed';
    changed.failure_message = 'The bank account has been closed.';
    changed.failure_balance_transaction = book(world, {
      type: 'payout_failure',
      category: 'payout_reversal',
      amount: changed.amount,
      currency: changed.currency,
      source: changed.id,
      description: 'PAYOUT FAILURE',
    }).id;
  });
}
