import type { AddressInfo } from 'node:net';
import { createControl, type Control } from './control';
import { Runtime } from './runtime';
import { createServer } from './server';
import { loadState, type Settings } from './state';
import { World } from './world';

export interface LocalPaymentsOptions {
  /** 0 takes any free port. */
  port: number;
  /** Where messages go; without it, none are sent. */
  webhookUrl?: string;
  webhookSecret: string;
  /** Where the state is kept; without it, in memory only. */
  dataFolder?: string;
  /** Milliseconds since 1970. */
  clock?: () => number;
  /** What differs from the defaults, or from what the folder holds. */
  settings?: Partial<Settings>;
}

export interface LocalPayments {
  /** Without a slash at its end. */
  url: string;
  close: () => Promise<void>;
  control: Control;
}

const TICK = 250;

/**
 * Starts the local stand-in for Stripe on 127.0.0.1.
 * @throws {Error} when the port is taken or the folder's state is of another version
 */
export async function startLocalPayments(options: LocalPaymentsOptions): Promise<LocalPayments> {
  const { port, webhookUrl, webhookSecret, dataFolder, clock = Date.now } = options;
  const world = new World(loadState(dataFolder), clock, '');
  Object.assign(world.settings, options.settings);
  const receiver =
    webhookUrl === undefined || webhookUrl === '' ? null : { url: webhookUrl, secret: webhookSecret };
  const runtime = new Runtime(world, dataFolder, receiver);
  const control = createControl(runtime);
  const server = createServer(runtime, control);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  world.baseUrl = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const ticking = setInterval(() => runtime.refresh(), TICK);
  ticking.unref();
  return {
    url: world.baseUrl,
    control,
    close: async () => {
      clearInterval(ticking);
      runtime.deliverer.close();
      runtime.save();
      server.closeAllConnections();
      await new Promise<void>((resolve) => server.close(() => resolve()));
    },
  };
}
