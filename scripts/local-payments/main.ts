import process from 'node:process';
import { z } from 'zod';
import { startLocalPayments } from './start-local-payments';

/** The local stand-in for Stripe as a program of its own; ends with SIGINT or SIGTERM. */

const environment = z.object({
  PORT: z.coerce.number().int().min(0).max(65_535).default(12_111),
  STRIPE_WEBHOOK_URL: z.url().optional(),
  STRIPE_WEBHOOK_SECRET: z.string().min(1).default('whsec_local'),
  LOCAL_PAYMENTS_FOLDER: z.string().min(1).default('.moiety/payments'),
});

async function main(): Promise<void> {
  const given = environment.parse(process.env);
  const running = await startLocalPayments({
    port: given.PORT,
    webhookUrl: given.STRIPE_WEBHOOK_URL,
    webhookSecret: given.STRIPE_WEBHOOK_SECRET,
    dataFolder: given.LOCAL_PAYMENTS_FOLDER,
    // The app may still be starting, or be down for a while: attempts over seven hours instead of three days.
    settings: { retryCompression: 10 },
  });
  console.log(`Local test payments at ${running.url}`);
  for (const signal of ['SIGINT', 'SIGTERM'] as const) {
    process.once(signal, () => {
      void running.close().then(() => process.exit(0));
    });
  }
}

main().catch((error: unknown) => {
  console.error(error instanceof z.ZodError ? z.prettifyError(error) : error);
  process.exit(1);
});
