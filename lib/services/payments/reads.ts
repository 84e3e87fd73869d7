import type Stripe from 'stripe';
import {
  readBalanceLine,
  readCharge,
  readDispute,
  readPayment,
  readPayout,
  readRefund,
} from './read-objects';
import { readFailure } from './errors';
import type { CardPayments, Period } from './types';

const PAGE = 100;

function createdIn({ from, to }: Period) {
  if (from === undefined && to === undefined) return {};
  // The service counts whole seconds: rounding up keeps the start inclusive and the end exclusive.
  const seconds = (at: Date) => Math.ceil(at.getTime() / 1000);
  return {
    created: {
      ...(from === undefined ? {} : { gte: seconds(from) }),
      ...(to === undefined ? {} : { lt: seconds(to) }),
    },
  };
}

/** Walks all pages of a list, one at a time. */
async function* walk<T, R>(list: () => AsyncIterable<T>, read: (item: T) => R): AsyncGenerator<R> {
  try {
    for await (const item of list()) yield read(item);
  } catch (error) {
    throw readFailure(error);
  }
}

type Reads = Omit<
  CardPayments,
  'createCheckout' | 'retrieveCheckout' | 'expireCheckout' | 'refund' | 'parseWebhook'
>;

/** Everything that only looks: single objects by id, and lists for the reconciliation with the ledger. */
export function createReads(
  stripe: () => Stripe,
  call: <T>(work: (client: Stripe) => Promise<T>) => Promise<T>,
): Reads {
  return {
    retrievePayment: (id) =>
      call(async (client) => {
        const expand = ['latest_charge.balance_transaction'];
        return readPayment(await client.paymentIntents.retrieve(id, { expand }));
      }),
    retrieveCharge: (id) => call(async (client) => readCharge(await client.charges.retrieve(id))),
    retrieveRefund: (id) => call(async (client) => readRefund(await client.refunds.retrieve(id))),
    retrieveDispute: (id) => call(async (client) => readDispute(await client.disputes.retrieve(id))),
    retrieveBalanceLine: (id) =>
      call(async (client) => readBalanceLine(await client.balanceTransactions.retrieve(id))),
    listBalanceLines: ({ payoutId, sourceId, ...period } = {}) =>
      walk(
        () =>
          stripe().balanceTransactions.list({
            limit: PAGE,
            ...createdIn(period),
            ...(payoutId === undefined ? {} : { payout: payoutId }),
            ...(sourceId === undefined ? {} : { source: sourceId }),
          }),
        readBalanceLine,
      ),
    listCharges: ({ intentId, ...period } = {}) =>
      walk(
        () =>
          stripe().charges.list({
            limit: PAGE,
            ...createdIn(period),
            ...(intentId === undefined ? {} : { payment_intent: intentId }),
          }),
        readCharge,
      ),
    listRefunds: ({ chargeId, intentId, ...period } = {}) =>
      walk(
        () =>
          stripe().refunds.list({
            limit: PAGE,
            ...createdIn(period),
            ...(chargeId === undefined ? {} : { charge: chargeId }),
            ...(intentId === undefined ? {} : { payment_intent: intentId }),
          }),
        readRefund,
      ),
    listDisputes: ({ chargeId, ...period } = {}) =>
      walk(
        () =>
          stripe().disputes.list({
            limit: PAGE,
            ...createdIn(period),
            ...(chargeId === undefined ? {} : { charge: chargeId }),
          }),
        readDispute,
      ),
    listPayouts: (period = {}) =>
      walk(() => stripe().payouts.list({ limit: PAGE, ...createdIn(period) }), readPayout),
  };
}
