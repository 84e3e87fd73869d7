import { randomBytes } from 'node:crypto';
import type { Settings, State, StoredEvent, Task } from './state';

const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789';

/** Such as `ch_3kV…`: the prefix names the kind of object. */
export function newId(prefix: string): string {
  const letters = [...randomBytes(24)].map((byte) => ALPHABET[byte % ALPHABET.length]);
  return `${prefix}_${letters.join('')}`;
}

function isPlain(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** What `before` had where `after` differs, as `previous_attributes` gives it. */
function differences(before: unknown, after: unknown): Record<string, unknown> {
  const result: Record<string, unknown> = {};
  if (!isPlain(before) || !isPlain(after)) return result;
  for (const key of new Set([...Object.keys(before), ...Object.keys(after)])) {
    const [old, current] = [before[key], after[key]];
    if (JSON.stringify(old) === JSON.stringify(current)) continue;
    result[key] = isPlain(old) && isPlain(current) ? differences(old, current) : (old ?? null);
  }
  return result;
}

/** The state with a clock, and the events that the work in hand has caused. */
export class World {
  /** Events since the last `takeEvents`. */
  #fresh: string[] = [];
  /** The call that is being worked on. */
  request: StoredEvent['request'] = { id: null, idempotency_key: null };

  constructor(
    public state: State,
    readonly clock: () => number,
    /** Where the payment page is, without a slash at its end. */
    public baseUrl: string,
  ) {}

  get settings(): Settings {
    return this.state.settings;
  }

  /** Milliseconds since 1970, moved forward by whoever controls the server. */
  nowMs(): number {
    return this.clock() + this.state.advanced * 1000;
  }

  /** Whole seconds since 1970. */
  now(): number {
    return Math.floor(this.nowMs() / 1000);
  }

  schedule(kind: Task['kind'], id: string, after: number): void {
    this.state.tasks.push({ kind, id, at: this.now() + after });
  }

  unschedule(id: string, ...kinds: Task['kind'][]): void {
    this.state.tasks = this.state.tasks.filter((task) => task.id !== id || !kinds.includes(task.kind));
  }

  /** Records an event about an object as it is now. */
  emit(type: string, object: unknown, previous?: Record<string, unknown>): void {
    const copies = this.settings.hasTwinEvents ? 2 : 1;
    for (let copy = 0; copy < copies; copy += 1) {
      const event: StoredEvent = {
        id: newId('evt'),
        object: 'event',
        api_version: this.settings.apiVersion,
        created: this.now(),
        data: {
          object: structuredClone(object),
          ...(previous === undefined ? {} : { previous_attributes: previous }),
        },
        livemode: false,
        pending_webhooks: 0,
        request: { ...this.request },
        type,
      };
      this.state.events[event.id] = event;
      this.#fresh.push(event.id);
    }
  }

  /** Changes an object in place, then records events that say what it was before. */
  change<T extends object>(object: T, types: readonly string[], work: (object: T) => void): T {
    const before = structuredClone(object);
    work(object);
    for (const type of types) this.emit(type, object, differences(before, object));
    return object;
  }

  takeEvents(): string[] {
    const taken = this.#fresh;
    this.#fresh = [];
    return taken;
  }
}
