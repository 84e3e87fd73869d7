import type Stripe from 'stripe';
import { refused } from './api-error';
import { book } from './balance';
import { cardOf, idOf } from './charges';
import { newId, type World } from './world';

/** Days in which evidence can be handed in; the schemes give one to three weeks. */
const ANSWER_DAYS = 9;

export type DisputeKind = 'fraudulent' | 'product_not_received' | 'inquiry';

export const evidenceTexts = [
  'access_activity_log',
  'billing_address',
  'cancellation_policy_disclosure',
  'cancellation_rebuttal',
  'customer_email_address',
  'customer_name',
  'customer_purchase_ip',
  'duplicate_charge_explanation',
  'duplicate_charge_id',
  'product_description',
  'refund_policy_disclosure',
  'refund_refusal_explanation',
  'service_date',
  'shipping_address',
  'shipping_carrier',
  'shipping_date',
  'shipping_tracking_number',
  'uncategorized_text',
] as const;

function emptyEvidence(): Stripe.Dispute.Evidence {
  const texts = Object.fromEntries(evidenceTexts.map((name) => [name, null])) as Record<
    (typeof evidenceTexts)[number],
    null
  >;
  return {
    ...texts,
    cancellation_policy: null,
    customer_communication: null,
    customer_signature: null,
    duplicate_charge_documentation: null,
    enhanced_evidence: {},
    receipt: null,
    refund_policy: null,
    service_documentation: null,
    shipping_documentation: null,
    uncategorized_file: null,
  };
}

function addBooking(
  world: World,
  dispute: Stripe.Dispute,
  amount: number,
  fee: number,
  category: string,
): void {
  const line = book(world, {
    type: 'adjustment',
    category,
    amount,
    fee,
    feeDescription: 'Dispute fee',
    currency: dispute.currency,
    source: dispute.id,
    description: `${amount < 0 ? 'Chargeback withdrawal' : 'Chargeback reversal'} for ${idOf(dispute.charge)}`,
  });
  dispute.balance_transactions = [...dispute.balance_transactions, line];
}

/** The money leaves when a dispute opens, and a fee with it. */
function withdraw(world: World, dispute: Stripe.Dispute): void {
  world.change(dispute, ['charge.dispute.funds_withdrawn'], (changed) => {
    addBooking(world, changed, -changed.amount, world.settings.disputeFee, 'dispute');
    changed.is_charge_refundable = false;
  });
}

export function openDispute(world: World, charge: Stripe.Charge, kind?: DisputeKind): Stripe.Dispute {
  if (!charge.paid || charge.disputed) throw refused(`Charge ${charge.id} cannot be disputed.`);
  const chosen = kind ?? cardOf(world, idOf(charge.payment_intent))?.dispute ?? 'fraudulent';
  const isInquiry = chosen === 'inquiry';
  const dispute: Stripe.Dispute = {
    id: newId('du'),
    object: 'dispute',
    amount: charge.amount_captured - charge.amount_refunded,
    balance_transactions: [],
    charge: charge.id,
    created: world.now(),
    currency: charge.currency,
    enhanced_eligibility_types: [],
    evidence: emptyEvidence(),
    evidence_details: {
      due_by: world.now() + ANSWER_DAYS * 86_400,
      enhanced_eligibility: {},
      has_evidence: false,
      past_due: false,
      submission_count: 0,
      submission_method: 'not_submitted',
    },
    intended_submission_method: null,
    is_charge_refundable: isInquiry,
    livemode: false,
    metadata: {},
    payment_intent: idOf(charge.payment_intent),
    reason: chosen === 'product_not_received' ? 'product_not_received' : isInquiry ? 'general' : 'fraudulent',
    status: isInquiry ? 'warning_needs_response' : 'needs_response',
  };
  world.state.disputes[dispute.id] = dispute;
  charge.disputed = true;
  world.emit('charge.dispute.created', dispute);
  if (!isInquiry) withdraw(world, dispute);
  world.schedule('end-dispute', dispute.id, ANSWER_DAYS * 86_400);
  return dispute;
}

const isInquiry = (dispute: Stripe.Dispute) => dispute.status.startsWith('warning_');
const isClosed = (dispute: Stripe.Dispute) => ['won', 'lost', 'warning_closed'].includes(dispute.status);

function assertOpen(dispute: Stripe.Dispute): void {
  if (isClosed(dispute)) throw refused('This dispute is already closed.', 'dispute_already_closed');
}

/** Takes evidence; two texts decide at once: `winning_evidence` and `losing_evidence` in `uncategorized_text`. */
export function updateDispute(
  world: World,
  dispute: Stripe.Dispute,
  change: { evidence: Record<string, string>; metadata: Record<string, string>; submits: boolean },
): void {
  const hasEvidence = Object.keys(change.evidence).length > 0;
  if (hasEvidence || change.submits) assertOpen(dispute);
  world.change(dispute, ['charge.dispute.updated'], (changed) => {
    Object.assign(changed.evidence, change.evidence);
    changed.metadata = change.metadata;
    if (hasEvidence) changed.evidence_details.has_evidence = true;
    if (!change.submits) return;
    changed.evidence_details.submission_count += 1;
    changed.evidence_details.submission_method = 'manual';
    changed.status = isInquiry(changed) ? 'warning_under_review' : 'under_review';
  });
  if (!change.submits) return;
  world.unschedule(dispute.id, 'end-dispute');
  const text = dispute.evidence.uncategorized_text;
  if (text === 'winning_evidence') world.schedule('win-dispute', dispute.id, 0);
  if (text === 'losing_evidence') world.schedule('lose-dispute', dispute.id, 0);
}

/** The bank's decision. An inquiry that is lost becomes a dispute; one that is won is closed without money. */
export function decideDispute(world: World, dispute: Stripe.Dispute, isWon: boolean): void {
  assertOpen(dispute);
  world.unschedule(dispute.id, 'end-dispute', 'win-dispute', 'lose-dispute');
  if (isInquiry(dispute) && !isWon) {
    world.change(dispute, ['charge.dispute.updated'], (changed) => {
      changed.status = 'needs_response';
      changed.evidence_details.due_by = world.now() + ANSWER_DAYS * 86_400;
    });
    withdraw(world, dispute);
    world.schedule('end-dispute', dispute.id, ANSWER_DAYS * 86_400);
    return;
  }
  const hadMoney = !isInquiry(dispute);
  world.change(dispute, ['charge.dispute.closed'], (changed) => {
    changed.status = hadMoney ? (isWon ? 'won' : 'lost') : 'warning_closed';
  });
  if (!isWon || !hadMoney) return;
  world.change(dispute, ['charge.dispute.funds_reinstated'], (changed) => {
    const fee = world.settings.returnsDisputeFee ? -world.settings.disputeFee : 0;
    addBooking(world, changed, changed.amount, fee, 'dispute_reversal');
    changed.is_charge_refundable = false;
  });
}

/** Nobody answered in time, or the seller accepts the loss. */
export function endDispute(world: World, dispute: Stripe.Dispute): void {
  if (isClosed(dispute)) return;
  dispute.evidence_details.past_due = (dispute.evidence_details.due_by ?? Infinity) <= world.now();
  decideDispute(world, dispute, isInquiry(dispute));
}
