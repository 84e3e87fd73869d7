import { createHmac } from 'node:crypto';
import http from 'node:http';
import https from 'node:https';
import type { Delivery, Settings } from './state';
import { newId, type World } from './world';

/** Seconds between attempts, together a little under three days, as the live service spreads them. */
const BACKOFF = [5, 60, 300, 1_800, 7_200, 18_000, 36_000, 43_200, 43_200, 43_200, 43_200];

export interface Attempt {
  eventId: string;
  type: string;
  /** Counted from 1. */
  attempt: number;
  /** The receiver's status; null when it gave none in time. */
  status: number | null;
  at: number;
}

export interface Receiver {
  url: string;
  secret: string;
}

const sign = (secret: string, signed: string) => createHmac('sha256', secret).update(signed).digest('hex');

/** The header over a body, for the time of this attempt. */
function signatureHeader(secret: string, now: number, body: string, how: Settings['signature']): string {
  const time = how === 'stale' ? now - 3_600 : now;
  const good = sign(secret, `${time}.${body}`);
  const other = sign(`${secret}_other`, `${time}.${body}`);
  if (how === 'bad') return `t=${time},v1=${other}`;
  return how === 'rotating' ? `t=${time},v1=${other},v1=${good}` : `t=${time},v1=${good}`;
}

function post(
  url: string,
  body: string,
  headers: Record<string, string>,
  timeout: number,
): Promise<number | null> {
  return new Promise((resolve) => {
    const { request } = url.startsWith('https:') ? https : http;
    const call = request(url, {
      method: 'POST',
      headers: { ...headers, 'content-length': String(Buffer.byteLength(body)) },
      agent: false,
      signal: AbortSignal.timeout(timeout),
    });
    call.on('response', (answer) => {
      answer.resume();
      answer.on('end', () => resolve(answer.statusCode ?? null));
      answer.on('error', () => resolve(null));
    });
    call.on('error', () => resolve(null));
    call.end(body);
  });
}

function shuffle<T>(items: T[]): T[] {
  for (let at = items.length - 1; at > 0; at -= 1) {
    const other = Math.floor(Math.random() * (at + 1));
    [items[at], items[other]] = [items[other] as T, items[at] as T];
  }
  return items;
}

/** Sends events to the receiver, at least once each, until it says 2xx or three days have passed. */
export class Deliverer {
  readonly #underWay = new Set<Delivery>();
  #waiting: (() => void)[] = [];
  #isClosed = false;
  /** The last attempts, oldest first. */
  readonly attempts: Attempt[] = [];

  constructor(
    private readonly world: World,
    private readonly receiver: Receiver | null,
    private readonly onChange: () => void,
  ) {}

  enqueue(eventIds: readonly string[]): void {
    if (this.receiver === null) return;
    const { settings } = this.world;
    const copies = eventIds.flatMap((id) => Array.from({ length: settings.duplicates + 1 }, () => id));
    if (settings.order === 'shuffled') shuffle(copies);
    if (settings.order === 'reversed') copies.reverse();
    for (const eventId of copies) {
      const dueAt = this.world.nowMs() + settings.delay * 1000;
      this.world.state.deliveries.push({ id: newId('dlv'), eventId, attempts: 0, dueAt });
      const event = this.world.state.events[eventId];
      if (event !== undefined) event.pending_webhooks += 1;
    }
  }

  #nextDue(): Delivery | undefined {
    if (this.world.settings.isPaused || this.#isClosed) return undefined;
    const now = this.world.nowMs();
    return this.world.state.deliveries.find(
      (delivery) => delivery.dueAt <= now && !this.#underWay.has(delivery),
    );
  }

  /** Starts what is due, as far as the limit of attempts under way allows. */
  pump(): void {
    while (this.#underWay.size < this.world.settings.concurrency) {
      const delivery = this.#nextDue();
      if (delivery === undefined) break;
      this.#underWay.add(delivery);
      void this.#attempt(delivery).finally(() => {
        this.#underWay.delete(delivery);
        if (!this.#isClosed) this.onChange();
        this.pump();
      });
    }
    if (this.#underWay.size > 0 || this.#nextDue() !== undefined) return;
    for (const resolve of this.#waiting.splice(0)) resolve();
  }

  async #attempt(delivery: Delivery): Promise<void> {
    const event = this.world.state.events[delivery.eventId];
    if (event === undefined || this.receiver === null) return this.#drop(delivery);
    const { settings } = this.world;
    const body = JSON.stringify(event, null, 2);
    const headers = {
      'content-type': 'application/json; charset=utf-8',
      'user-agent': 'Local-Payments/1.0',
      'stripe-signature': signatureHeader(this.receiver.secret, this.world.now(), body, settings.signature),
    };
    const status = await post(this.receiver.url, body, headers, settings.deliveryTimeout * 1000);
    delivery.attempts += 1;
    this.attempts.push({
      eventId: event.id,
      type: event.type,
      attempt: delivery.attempts,
      status,
      at: this.world.now(),
    });
    this.attempts.splice(0, this.attempts.length - 1_000);
    const wait = BACKOFF[delivery.attempts - 1];
    if ((status !== null && status >= 200 && status < 300) || wait === undefined) {
      event.pending_webhooks = Math.max(0, event.pending_webhooks - 1);
      this.#drop(delivery);
      return;
    }
    delivery.dueAt = this.world.nowMs() + (wait * 1000) / settings.retryCompression;
  }

  #drop(delivery: Delivery): void {
    this.world.state.deliveries = this.world.state.deliveries.filter((other) => other !== delivery);
  }

  /** Waits until nothing is under way and nothing is due; what waits for another attempt is not waited for. */
  settle(): Promise<void> {
    return new Promise((resolve) => {
      this.#waiting.push(resolve);
      this.pump();
    });
  }

  close(): void {
    this.#isClosed = true;
    for (const resolve of this.#waiting.splice(0)) resolve();
  }
}
