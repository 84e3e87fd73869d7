import fs from 'node:fs';
import path from 'node:path';
import type Stripe from 'stripe';

/** What the server can be told to do differently; the names say what happens, the defaults are the calm case. */
export interface Settings {
  /** Of a charge; kept by the service when it is refunded. */
  fee: { basisPoints: number; fixed: number };
  /** Taken when a dispute opens. */
  disputeFee: number;
  /** Whether a dispute's fee comes back when it is won. */
  returnsDisputeFee: boolean;
  /** Seconds until a charge can be paid out. */
  availableAfter: number;
  /** Seconds until a late refund succeeds or fails. */
  refundAfter: number;
  /** Seconds from a payout to the bank. */
  payoutAfter: number;
  /** Books a charge a moment later: its first messages have no balance transaction, `charge.updated` follows. */
  booksLater: boolean;
  /** The version of the API that messages are written in. */
  apiVersion: string;
  /** How many more times each message is sent. */
  duplicates: number;
  /** Sends a second event object, with another id, for each change. */
  hasTwinEvents: boolean;
  order: 'as-made' | 'shuffled' | 'reversed';
  /** Seconds before the first attempt. */
  delay: number;
  signature: 'good' | 'bad' | 'stale' | 'rotating';
  /** Holds all messages back. */
  isPaused: boolean;
  /** Delivers before the call that caused it gets its answer. */
  deliversBeforeAnswer: boolean;
  /** Messages under way at the same time. */
  concurrency: number;
  /** Divides the waits between attempts, which otherwise stretch over three days. */
  retryCompression: number;
  /** Seconds of real time that the receiver may take. */
  deliveryTimeout: number;
  /** Milliseconds of real time before a call is worked on. */
  latency: number;
}

const defaultSettings: Settings = {
  fee: { basisPoints: 290, fixed: 30 },
  disputeFee: 1500,
  returnsDisputeFee: false,
  availableAfter: 2 * 86_400,
  refundAfter: 5,
  payoutAfter: 86_400,
  booksLater: false,
  apiVersion: '2026-10-28.endive',
  duplicates: 0,
  hasTwinEvents: false,
  order: 'as-made',
  delay: 0,
  signature: 'good',
  isPaused: false,
  deliversBeforeAnswer: false,
  concurrency: 1,
  retryCompression: 1,
  deliveryTimeout: 10,
  latency: 0,
};

export interface StoredEvent {
  id: string;
  object: 'event';
  api_version: string;
  created: number;
  data: { object: unknown; previous_attributes?: Record<string, unknown> };
  livemode: false;
  pending_webhooks: number;
  request: { id: string | null; idempotency_key: string | null };
  type: string;
}

export interface Delivery {
  id: string;
  eventId: string;
  attempts: number;
  /** Milliseconds of the server's clock. */
  dueAt: number;
}

export interface Task {
  kind:
    | 'expire-session'
    | 'open-dispute'
    | 'end-dispute'
    | 'win-dispute'
    | 'lose-dispute'
    | 'settle-refund'
    | 'fail-refund'
    | 'book-charge'
    | 'make-available'
    | 'pay-payout';
  id: string;
  /** Seconds of the server's clock. */
  at: number;
}

interface StoredAnswer {
  /** Of method, path and parameters. */
  fingerprint: string;
  status: number;
  body: string;
  requestId: string;
  at: number;
}

/** A fault that the next matching calls meet. */
export interface Fault {
  kind: 'error' | 'rate-limit' | 'drop';
  /** Before the work is done, or after it, when only the answer is lost. */
  when: 'before' | 'after';
  /** Path prefix, such as /v1/refunds. */
  path: string;
  times: number;
}

type Kept<T> = Record<string, T>;

/** Everything that the server keeps; what is newest stands last. */
export interface State {
  version: 1;
  /** Seconds that the clock was moved forward. */
  advanced: number;
  settings: Settings;
  customers: Kept<Stripe.Customer>;
  sessions: Kept<Stripe.Checkout.Session>;
  lineItems: Kept<Stripe.LineItem[]>;
  intents: Kept<Stripe.PaymentIntent>;
  charges: Kept<Stripe.Charge>;
  refunds: Kept<Stripe.Refund>;
  disputes: Kept<Stripe.Dispute>;
  balance: Kept<Stripe.BalanceTransaction>;
  payouts: Kept<Stripe.Payout>;
  events: Kept<StoredEvent>;
  /** What the intent of a session is made with. */
  intentOptions: Kept<{ metadata: Record<string, string>; description: string | null }>;
  /** Who is paying on the page of a session, while the bank asks the card's holder. */
  payers: Kept<{ email: string | null; name: string | null }>;
  /** The test card of an intent, by its number. */
  cards: Kept<string>;
  /** The automatic payout that a balance transaction went out with. */
  payoutOf: Kept<string>;
  deliveries: Delivery[];
  tasks: Task[];
  answers: Kept<StoredAnswer>;
  faults: Fault[];
}

export function emptyState(): State {
  return {
    version: 1,
    advanced: 0,
    settings: structuredClone(defaultSettings),
    customers: {},
    sessions: {},
    lineItems: {},
    intents: {},
    charges: {},
    refunds: {},
    disputes: {},
    balance: {},
    payouts: {},
    events: {},
    intentOptions: {},
    payers: {},
    cards: {},
    payoutOf: {},
    deliveries: [],
    tasks: [],
    answers: {},
    faults: [],
  };
}

const FILE = 'state.json';

/** @returns what the folder holds; an empty state without a folder or a file */
export function loadState(folder: string | undefined): State {
  const file = folder === undefined ? null : path.join(folder, FILE);
  if (file === null || !fs.existsSync(file)) return emptyState();
  const kept = JSON.parse(fs.readFileSync(file, 'utf8')) as State;
  if (kept.version !== 1) throw new Error(`${file} was written by another version; remove it to start over.`);
  return { ...emptyState(), ...kept, settings: { ...defaultSettings, ...kept.settings } };
}

/** Writes beside the file and renames, so that a crash leaves the old file or the new one, never half of one. */
export function saveState(folder: string | undefined, state: State): void {
  if (folder === undefined) return;
  fs.mkdirSync(folder, { recursive: true });
  const draft = path.join(folder, `${FILE}.${process.pid}.new`);
  const handle = fs.openSync(draft, 'w', 0o600);
  try {
    fs.writeSync(handle, JSON.stringify(state));
    fs.fsyncSync(handle);
  } finally {
    fs.closeSync(handle);
  }
  fs.renameSync(draft, path.join(folder, FILE));
}
