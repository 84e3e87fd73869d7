import type Stripe from 'stripe';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { payCharge, startSetting, type Setting } from './fixture';

let setting: Setting;
beforeAll(async () => {
  setting = await startSetting();
});
afterAll(() => setting.stop());
beforeEach(async () => {
  await setting.control.settle();
  setting.receiver.received.length = 0;
});

async function linesOf(source: string): Promise<[string, number, number, number][]> {
  const lines = await setting.stripe.balanceTransactions.list({ source });
  return lines.data.reverse().map((line) => [line.type, line.amount, line.fee, line.net]);
}

const told = async (type: string) => {
  await setting.control.settle();
  return setting.receiver.received.filter(({ event }) => event.type === type).map(({ event }) => event);
};

describe('a refund', () => {
  it('gives back a part, and the fee stays', async () => {
    const { charge } = await payCharge(setting, 10_000);
    await setting.control.settle();
    const refund = await setting.stripe.refunds.create({
      charge: charge.id,
      amount: 4_000,
      reason: 'requested_by_customer',
      metadata: { why: 'late' },
    });
    expect(refund).toMatchObject({ amount: 4_000, status: 'succeeded', metadata: { why: 'late' } });
    expect(await linesOf(refund.id)).toEqual([['refund', -4_000, 0, -4_000]]);
    expect(await linesOf(charge.id)).toEqual([['charge', 10_000, 320, 9_680]]);
    const [refunded] = await told('charge.refunded');
    expect(refunded?.data.object).toMatchObject({ amount_refunded: 4_000, refunded: false });
    expect(refunded?.data.previous_attributes).toEqual({ amount_refunded: 0 });
    expect(setting.receiver.types()).toEqual(expect.arrayContaining(['refund.created', 'refund.updated']));
    const second = await setting.stripe.refunds.create({ charge: charge.id });
    expect(second.amount).toBe(6_000);
    expect((await setting.stripe.charges.retrieve(charge.id)).refunded).toBe(true);
    expect((await told('charge.refunded'))[1]?.data.previous_attributes).toEqual({
      amount_refunded: 4_000,
      refunded: false,
    });
  });

  it('never exceeds what is left', async () => {
    const { charge, intent } = await payCharge(setting, 10_000);
    await setting.stripe.refunds.create({ payment_intent: intent.id, amount: 9_000 });
    await expect(setting.stripe.refunds.create({ charge: charge.id, amount: 1_001 })).rejects.toMatchObject({
      statusCode: 400,
      code: 'amount_too_large',
      param: 'amount',
    });
    await setting.stripe.refunds.create({ charge: charge.id, amount: 1_000 });
    await expect(setting.stripe.refunds.create({ charge: charge.id, amount: 1 })).rejects.toMatchObject({
      code: 'charge_already_refunded',
    });
    expect((await setting.stripe.charges.retrieve(charge.id)).amount_refunded).toBe(10_000);
  });

  it('may stay pending and succeed later', async () => {
    const { charge } = await payCharge(setting, 10_000, '4000000000007726');
    const refund = await setting.stripe.refunds.create({ charge: charge.id });
    expect(refund.status).toBe('pending');
    setting.control.advance({ seconds: 5 });
    expect((await setting.stripe.refunds.retrieve(refund.id)).status).toBe('succeeded');
    expect((await told('refund.updated'))[0]?.data.previous_attributes).toMatchObject({ status: 'pending' });
  });

  it('may succeed and fail days later: the money is back in the account and the charge not refunded', async () => {
    const { charge } = await payCharge(setting, 10_000, '4000000000005126');
    const refund = await setting.stripe.refunds.create({ charge: charge.id, amount: 4_000 });
    expect(refund.status).toBe('succeeded');
    setting.control.advance({ seconds: 3 * 86_400 });
    const failed = await setting.stripe.refunds.retrieve(refund.id, {
      expand: ['failure_balance_transaction'],
    });
    expect(failed).toMatchObject({ status: 'failed', failure_reason: 'expired_or_canceled_card' });
    expect(failed.failure_balance_transaction).toMatchObject({ type: 'refund_failure', net: 4_000 });
    expect(await linesOf(refund.id)).toEqual([
      ['refund', -4_000, 0, -4_000],
      ['refund_failure', 4_000, 0, 4_000],
    ]);
    expect(await setting.stripe.charges.retrieve(charge.id)).toMatchObject({
      amount_refunded: 0,
      refunded: false,
    });
    expect(await told('refund.failed')).toHaveLength(1);
  });
});

describe('a dispute', () => {
  async function disputeOf(card: string) {
    const { charge } = await payCharge(setting, 10_000, card);
    const [dispute] = (await setting.stripe.disputes.list({ charge: charge.id })).data;
    return { charge, dispute: dispute as Stripe.Dispute };
  }
  const submit = (dispute: Stripe.Dispute, text: string) =>
    setting.stripe.disputes.update(dispute.id, { evidence: { uncategorized_text: text } });

  it('takes the money and a fee when it opens, and bars refunds', async () => {
    const { charge, dispute } = await disputeOf('4000000000000259');
    expect(dispute).toMatchObject({ status: 'needs_response', reason: 'fraudulent', amount: 10_000 });
    expect(dispute.balance_transactions).toHaveLength(1);
    expect(await linesOf(dispute.id)).toEqual([['adjustment', -10_000, 1_500, -11_500]]);
    expect((await setting.stripe.charges.retrieve(charge.id)).disputed).toBe(true);
    await expect(setting.stripe.refunds.create({ charge: charge.id })).rejects.toMatchObject({
      code: 'charge_disputed',
    });
    await setting.control.settle();
    const types = setting.receiver.types();
    expect(types).toContain('charge.dispute.created');
    expect(types).toContain('charge.dispute.funds_withdrawn');
  });

  it('brings the money back when won, but keeps its fee', async () => {
    const { dispute } = await disputeOf('4000000000002685');
    expect(dispute.reason).toBe('product_not_received');
    expect((await submit(dispute, 'winning_evidence')).status).toBe('under_review');
    expect((await setting.stripe.disputes.retrieve(dispute.id)).status).toBe('won');
    expect(await linesOf(dispute.id)).toEqual([
      ['adjustment', -10_000, 1_500, -11_500],
      ['adjustment', 10_000, 0, 10_000],
    ]);
    await setting.control.settle();
    const types = setting.receiver.types();
    for (const type of ['updated', 'closed', 'funds_reinstated'])
      expect(types).toContain(`charge.dispute.${type}`);
    await expect(submit(dispute, 'more')).rejects.toMatchObject({ code: 'dispute_already_closed' });
  });

  it('is lost by weak evidence, by closing it, and by saying nothing', async () => {
    const weak = await disputeOf('4000000000000259');
    await submit(weak.dispute, 'losing_evidence');
    const closed = await disputeOf('4000000000000259');
    await setting.stripe.disputes.close(closed.dispute.id);
    const silent = await disputeOf('4000000000000259');
    setting.control.advance({ seconds: 10 * 86_400 });
    for (const { dispute } of [weak, closed, silent]) {
      expect((await setting.stripe.disputes.retrieve(dispute.id)).status).toBe('lost');
      expect(await linesOf(dispute.id)).toHaveLength(1);
    }
  });

  it('waits for the bank when the evidence decides nothing', async () => {
    const { dispute } = await disputeOf('4000000000000259');
    await submit(dispute, 'The parcel was signed for.');
    setting.control.advance({ seconds: 30 * 86_400 });
    expect((await setting.stripe.disputes.retrieve(dispute.id)).status).toBe('under_review');
    expect(setting.control.decideDispute({ id: dispute.id, outcome: 'won' }).status).toBe('won');
  });

  it('may begin as an inquiry without money, and become a dispute', async () => {
    const { charge, dispute } = await disputeOf('4000000000001976');
    expect(dispute).toMatchObject({ status: 'warning_needs_response', balance_transactions: [] });
    const raised = setting.control.decideDispute({ id: dispute.id, outcome: 'lost' });
    expect(raised.status).toBe('needs_response');
    expect(await linesOf(dispute.id)).toEqual([['adjustment', -10_000, 1_500, -11_500]]);
    expect((await setting.stripe.charges.retrieve(charge.id)).disputed).toBe(true);
    const other = await disputeOf('4000000000001976');
    expect(setting.control.decideDispute({ id: other.dispute.id, outcome: 'won' }).status).toBe(
      'warning_closed',
    );
    expect(await linesOf(other.dispute.id)).toEqual([]);
  });
});
