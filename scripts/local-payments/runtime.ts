import { Deliverer, type Receiver } from './deliveries';
import { saveState } from './state';
import { runDueTasks } from './tasks';
import type { World } from './world';

const KEPT_ANSWERS = 24 * 3_600;
const KEPT_EVENTS = 30 * 86_400;

/** The world with what must happen around every piece of work: what is due, what is sent, what is kept. */
export class Runtime {
  readonly deliverer: Deliverer;

  constructor(
    readonly world: World,
    private readonly folder: string | undefined,
    receiver: Receiver | null,
  ) {
    this.deliverer = new Deliverer(world, receiver, () => this.save());
  }

  save(): void {
    saveState(this.folder, this.world.state);
  }

  #forgetOld(): void {
    const { state } = this.world;
    const now = this.world.now();
    for (const [key, answer] of Object.entries(state.answers)) {
      if (answer.at + KEPT_ANSWERS <= now) delete state.answers[key];
    }
    const waiting = new Set(state.deliveries.map((delivery) => delivery.eventId));
    for (const [id, event] of Object.entries(state.events)) {
      if (event.created + KEPT_EVENTS <= now && !waiting.has(id)) delete state.events[id];
    }
  }

  /** Does what became due since, before other work looks at the state. */
  refresh(): void {
    this.world.request = { id: null, idempotency_key: null };
    this.#forgetOld();
    if (runDueTasks(this.world)) this.commit();
    else this.deliverer.pump();
  }

  /** Keeps what the work in hand has changed, then starts sending what it caused. */
  commit(): void {
    const caused = this.world.takeEvents();
    this.world.request = { id: null, idempotency_key: null };
    runDueTasks(this.world);
    this.deliverer.enqueue([...caused, ...this.world.takeEvents()]);
    this.save();
    this.deliverer.pump();
  }
}
