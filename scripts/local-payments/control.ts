import type Stripe from 'stripe';
import { z } from 'zod';
import { testCards, type TestCard } from './cards';
import { ApiError, missing } from './api-error';
import { answerSessionChallenge, paySession } from './checkout-sessions';
import type { Attempt } from './deliveries';
import { decideDispute, openDispute } from './disputes';
import { failPayout, payOutAvailable } from './payouts';
import { failRefund, settleRefund } from './refunds';
import type { Runtime } from './runtime';
import { emptyState, type Settings, type State } from './state';

const seconds = z.number().nonnegative();
const settingsPatch = z
  .strictObject({
    fee: z.strictObject({ basisPoints: z.int().min(0).max(10_000), fixed: z.int().min(0) }),
    disputeFee: z.int().min(0),
    returnsDisputeFee: z.boolean(),
    availableAfter: z.int().min(0),
    refundAfter: z.int().min(0),
    payoutAfter: z.int().min(0),
    booksLater: z.boolean(),
    apiVersion: z.string(),
    duplicates: z.int().min(0).max(1_000),
    hasTwinEvents: z.boolean(),
    order: z.enum(['as-made', 'shuffled', 'reversed']),
    delay: seconds,
    signature: z.enum(['good', 'bad', 'stale', 'rotating']),
    isPaused: z.boolean(),
    deliversBeforeAnswer: z.boolean(),
    concurrency: z.int().min(1).max(200),
    retryCompression: z.number().min(1),
    deliveryTimeout: z.number().positive(),
    latency: z.int().min(0),
  })
  .partial();

const id = z.strictObject({ id: z.string() });
const inputs = {
  configure: settingsPatch,
  advance: z.strictObject({ seconds }),
  pay: z.strictObject({
    session: z.string(),
    card: z.string().default('4242424242424242'),
    /** What the holder answers when the bank asks; `leave` closes the page. */
    challenge: z.enum(['accept', 'fail', 'leave']).default('accept'),
    email: z.string().nullable().default(null),
  }),
  openDispute: z.strictObject({
    charge: z.string(),
    kind: z.enum(['fraudulent', 'product_not_received', 'inquiry']).optional(),
  }),
  decideDispute: z.strictObject({ id: z.string(), outcome: z.enum(['won', 'lost']) }),
  settleRefund: id,
  failRefund: id,
  payOut: z.strictObject({ currency: z.string().default('usd') }),
  failPayout: id,
  sendEvent: z.strictObject({ type: z.string(), object: z.record(z.string(), z.unknown()) }),
  redeliver: z.strictObject({ event: z.string(), times: z.int().min(1).max(1_000).default(1) }),
  fault: z.strictObject({
    kind: z.enum(['error', 'rate-limit', 'drop']),
    when: z.enum(['before', 'after']).default('before'),
    path: z.string().default('/v1/'),
    times: z.int().min(1).default(1),
  }),
};

type Input<Name extends keyof typeof inputs> = z.input<(typeof inputs)[Name]>;

export interface PayResult {
  outcome: 'paid' | 'declined' | 'challenged';
  /** The code of the decline. */
  code: string | null;
  message: string | null;
}

function need<T>(kept: Record<string, T>, kind: string, key: string): T {
  const found = kept[key];
  if (found === undefined) throw missing(kind, key);
  return found;
}

function needCard(number: string): TestCard {
  const found = testCards.find((card) => card.number === number.replace(/\s/g, ''));
  if (found === undefined) throw missing('test card', number);
  return found;
}

/** What whoever runs the server can make it do; over HTTP, `POST /_control/<name>` with the same input as JSON. */
export function createControl(runtime: Runtime) {
  const { world, deliverer } = runtime;
  /** Does the work with the state up to date, and keeps and sends what it caused. */
  function act<T>(work: (state: State) => T): T {
    runtime.refresh();
    try {
      return work(world.state);
    } finally {
      runtime.commit();
    }
  }
  function attemptPay(state: State, input: Input<'pay'>): PayResult {
    const { session: key, card, challenge, email } = inputs.pay.parse(input);
    const session = need(state.sessions, 'checkout.session', key);
    const payer = { email: email ?? session.customer_email, name: 'Test Buyer' };
    try {
      const isChallenged = paySession(world, session, needCard(card), payer);
      if (isChallenged && challenge === 'leave') return { outcome: 'challenged', code: null, message: null };
      if (isChallenged) answerSessionChallenge(world, session, challenge === 'accept', payer);
      return { outcome: 'paid', code: null, message: null };
    } catch (error) {
      if (!(error instanceof ApiError) || error.status !== 402) throw error;
      return {
        outcome: 'declined',
        code: error.body.decline_code ?? error.body.code ?? null,
        message: error.message,
      };
    }
  }
  return {
    /** Changes how the server behaves from now on. */
    configure: (input: Input<'configure'>): Settings =>
      act((state) => Object.assign(state.settings, inputs.configure.parse(input))),
    /** Moves the clock forward; what becomes due by it happens. */
    advance: (input: Input<'advance'>): { now: number } =>
      act((state) => {
        state.advanced += inputs.advance.parse(input).seconds;
        return { now: world.now() };
      }),
    /** Waits until no message is under way or due. */
    settle: async (): Promise<{ waiting: number }> => {
      runtime.refresh();
      await deliverer.settle();
      return { waiting: world.state.deliveries.length };
    },
    /** Pays an open session as a buyer on its page would. */
    pay: (input: Input<'pay'>): PayResult => act((state) => attemptPay(state, input)),
    openDispute: (input: Input<'openDispute'>): Stripe.Dispute =>
      act((state) => {
        const { charge, kind } = inputs.openDispute.parse(input);
        return structuredClone(openDispute(world, need(state.charges, 'charge', charge), kind));
      }),
    decideDispute: (input: Input<'decideDispute'>): Stripe.Dispute =>
      act((state) => {
        const { id: key, outcome } = inputs.decideDispute.parse(input);
        const dispute = need(state.disputes, 'dispute', key);
        decideDispute(world, dispute, outcome === 'won');
        return structuredClone(dispute);
      }),
    settleRefund: (input: Input<'settleRefund'>): Stripe.Refund =>
      act((state) => {
        const refund = need(state.refunds, 'refund', inputs.settleRefund.parse(input).id);
        settleRefund(world, refund);
        return structuredClone(refund);
      }),
    failRefund: (input: Input<'failRefund'>): Stripe.Refund =>
      act((state) => {
        const refund = need(state.refunds, 'refund', inputs.failRefund.parse(input).id);
        failRefund(world, refund);
        return structuredClone(refund);
      }),
    /** Pays out all that is available, as the service does by itself every day; null when there is nothing. */
    payOut: (input: Input<'payOut'> = {}): Stripe.Payout | null =>
      act(() => structuredClone(payOutAvailable(world, inputs.payOut.parse(input).currency))),
    failPayout: (input: Input<'failPayout'>): Stripe.Payout =>
      act((state) => {
        const payout = need(state.payouts, 'payout', inputs.failPayout.parse(input).id);
        failPayout(world, payout);
        return structuredClone(payout);
      }),
    /** Sends a message about an object that this server never made. */
    sendEvent: (input: Input<'sendEvent'>): { sent: true } =>
      act(() => {
        const { type, object } = inputs.sendEvent.parse(input);
        world.emit(type, object);
        return { sent: true };
      }),
    /** Sends a message again that was sent before. */
    redeliver: (input: Input<'redeliver'>): { sent: true } =>
      act((state) => {
        const { event, times } = inputs.redeliver.parse(input);
        need(state.events, 'event', event);
        deliverer.enqueue(Array.from({ length: times }, () => event));
        return { sent: true };
      }),
    /** Lets the next calls of the API fail. */
    fault: (input: Input<'fault'>): { planned: true } =>
      act((state) => {
        state.faults.push(inputs.fault.parse(input));
        return { planned: true };
      }),
    /** The last attempts to deliver, oldest first, and how many messages still wait. */
    deliveries: (): { attempts: Attempt[]; waiting: number } => ({
      attempts: [...deliverer.attempts],
      waiting: world.state.deliveries.length,
    }),
    /** Forgets everything, also the settings. */
    reset: (): { done: true } => {
      world.state = emptyState();
      runtime.commit();
      return { done: true };
    },
  };
}

export type Control = ReturnType<typeof createControl>;

/** Calls a control by its name, for HTTP. */
export async function callControl(control: Control, name: string, input: unknown): Promise<unknown> {
  if (!Object.hasOwn(control, name)) throw missing('control', name);
  const work = control[name as keyof Control] as (given: unknown) => unknown;
  return await work(input);
}
