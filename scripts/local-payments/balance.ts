import type Stripe from 'stripe';
import { feeOf } from './amounts';
import { newId, type World } from './world';

interface Booking {
  type: 'charge' | 'refund' | 'refund_failure' | 'adjustment' | 'payout' | 'payout_failure';
  category: string;
  amount: number;
  fee?: number;
  feeDescription?: string;
  currency: string;
  source: string;
  description: string | null;
  /** Seconds until it can be paid out. */
  availableAfter?: number;
}

/** Books one line of the account. */
export function book(world: World, booking: Booking): Stripe.BalanceTransaction {
  const { amount, fee = 0, availableAfter = 0, currency } = booking;
  const line: Stripe.BalanceTransaction = {
    id: newId('txn'),
    object: 'balance_transaction',
    amount,
    available_on: world.now() + availableAfter,
    balance_type: 'payments',
    created: world.now(),
    currency,
    description: booking.description,
    exchange_rate: null,
    fee,
    fee_details:
      fee === 0
        ? []
        : [
            {
              amount: fee,
              application: null,
              currency,
              description: booking.feeDescription ?? 'Processing fees',
              type: 'stripe_fee',
            },
          ],
    net: amount - fee,
    reporting_category: booking.category,
    source: booking.source,
    status: availableAfter === 0 ? 'available' : 'pending',
    type: booking.type,
  };
  world.state.balance[line.id] = line;
  if (availableAfter > 0) world.schedule('make-available', line.id, availableAfter);
  return line;
}

/** Books a charge with the service's fee, which no refund gives back. */
export function bookCharge(world: World, charge: Stripe.Charge, isAvailableAtOnce: boolean): string {
  const line = book(world, {
    type: 'charge',
    category: 'charge',
    amount: charge.amount_captured,
    fee: feeOf(charge.amount_captured, world.settings.fee),
    currency: charge.currency,
    source: charge.id,
    description: charge.description,
    availableAfter: isAvailableAtOnce ? 0 : world.settings.availableAfter,
  });
  return line.id;
}

export function makeAvailable(world: World, id: string): void {
  const line = world.state.balance[id];
  if (line !== undefined) line.status = 'available';
}

/** The sums of the account per currency. */
export function sumBalance(world: World): Stripe.Balance {
  const sums = new Map<string, { available: number; pending: number }>();
  for (const line of Object.values(world.state.balance)) {
    const sum = sums.get(line.currency) ?? { available: 0, pending: 0 };
    if (line.status === 'available') sum.available += line.net;
    else sum.pending += line.net;
    sums.set(line.currency, sum);
  }
  const amounts = (of: 'available' | 'pending') =>
    [...sums].map(([currency, sum]) => ({ amount: sum[of], currency, source_types: { card: sum[of] } }));
  return { object: 'balance', available: amounts('available'), pending: amounts('pending'), livemode: false };
}
