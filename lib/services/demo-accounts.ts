import 'server-only';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { z } from 'zod';
import { configuration } from './configuration';

const demoAccount = z.object({
  email: z.string(),
  password: z.string(),
  role: z.string(),
  name: z.string(),
  what: z.string(),
});
export type DemoAccount = z.infer<typeof demoAccount>;

/** The accounts that the demo offers on its sign-in page; none outside of the demo. */
export async function readDemoAccounts(): Promise<DemoAccount[]> {
  if (!configuration().isDemo) return [];
  const file =
    process.env.DEMO_ACCOUNTS_FILE ??
    path.join(/* turbopackIgnore: true */ process.cwd(), '.moiety/demo-accounts.json');
  const text = await readFile(/* turbopackIgnore: true */ file, 'utf8').catch(() => '[]');
  return z.array(demoAccount).catch([]).parse(JSON.parse(text));
}
