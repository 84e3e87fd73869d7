import { writeFile } from 'node:fs/promises';
import { closeDatabase } from '@/db/connection';
import { setClock } from '@/lib/services/clock';
import { stopWorking } from '@/lib/services/jobs';
import { addAnimals } from './scenario/collection';
import { addContacts } from './scenario/contacts';
import { addAccounts, addHouse, addTubs, isHouseThere } from './scenario/house';
import { adults, bp0, cs0, youngOf } from './scenario/lineage';
import { buyer, demoPassword, members } from './scenario/people';
import { addPhotos } from './scenario/photos';
import { addProjects } from './scenario/projects';
import { addSeason } from './scenario/season';
import { addSpecies } from './scenario/species';

/** Sows the demo scenario; does nothing when it is there already. */
async function sow(now: Date): Promise<string> {
  if (await isHouseThere()) return 'The Kilnhouse is there already; nothing was written.';
  await addAccounts();
  await addHouse(new Date(now.getTime() - 1200 * 86_400_000));
  await addSpecies();
  const tubs = await addTubs();
  await addAnimals(adults, tubs.adult, now);
  await addProjects(now);
  await addSeason(now, tubs.hatchling);
  setClock(null);
  await addContacts(now);
  const hatchlings = [...youngOf.values()].flatMap((clutch) => clutch.slice(0, 4));
  await addPhotos([...bp0, ...cs0.slice(0, 4), ...hatchlings], now);
  return 'The Kilnhouse is sown.';
}

const accountsFile = process.env.DEMO_ACCOUNTS_FILE ?? '.moiety/demo-accounts.json';

try {
  console.info(await sow(new Date()));
  const accounts = [...members, buyer].map(({ email, role, name, what }) => ({
    email,
    password: demoPassword,
    role,
    name,
    what,
  }));
  await writeFile(accountsFile, `${JSON.stringify(accounts, null, 2)}\n`);
} finally {
  setClock(null);
  await stopWorking();
  await closeDatabase();
}
