import { eq } from 'drizzle-orm';
import { pairings, clutches } from '@/db/schema/season';
import { projectAnimals, termsVersions } from '@/db/schema/projects';
import { withScope } from '@/db/scope';
import type { PairingId, TubId } from '@/lib/contracts/ids';
import type { PairingEventKind } from '@/lib/contracts/pairing-figures';
import { decidePairingUseCase } from '@/lib/use-cases/season/decide-pairing';
import { logPairingEventUseCase } from '@/lib/use-cases/season/log-pairing-event';
import { proposePairingUseCase } from '@/lib/use-cases/season/propose-pairing';
import { perform } from '@/lib/use-cases/perform';
import { dayFromNow } from '../calendar';
import { addAnimals, animalIdOf, clutchIdOf } from './collection';
import { slug, workspaceId } from './house';
import { bp0, bp1, bp2, cs0, cs2, ofSex, pastPairs, youngOf } from './lineage';
import { callerOf, liveAt } from './live-at';
import { dateNotices } from './notices';
import { maren, ravi, tobias, type DemoPerson } from './people';
import { ember, loft, type SownProject } from './projects';
import type { Simulated } from './simulate';

type Seen = [kind: PairingEventKind, day: number, minutes?: number];
interface Plan {
  key: string;
  project: SownProject;
  sire: Simulated;
  dam: Simulated;
  starts: number;
  ends: number;
  eggs: number;
  note: string;
  /** Who has not answered. */
  waits?: DemoPerson;
  seen: Seen[];
}

async function propose(plan: Plan, now: Date): Promise<PairingId> {
  const { project, sire, dam } = plan;
  const proposedOn = Math.min(plan.starts - 8, -2);
  liveAt(now, proposedOn);
  const { id, versionId } = await perform(proposePairingUseCase, callerOf(maren, `pairing ${plan.key}`), {
    params: { workspace: slug },
    body: {
      projectId: project.id,
      sireId: animalIdOf(sire),
      damId: animalIdOf(dam),
      startsOn: dayFromNow(now, plan.starts),
      endsOn: dayFromNow(now, plan.ends),
      eggsExpected: plan.eggs,
      note: plan.note,
      answerBy: dayFromNow(now, proposedOn + 9),
    },
  });
  for (const partner of project.partners) {
    if (partner === maren || partner === plan.waits) continue;
    liveAt(now, proposedOn + 1);
    await perform(decidePairingUseCase, callerOf(partner), {
      params: { workspace: slug, pairing: id },
      body: { versionId, decision: 'agreed' },
    });
  }
  for (const [kind, day, minutes] of plan.seen) {
    liveAt(now, day);
    await perform(logPairingEventUseCase, callerOf(ravi), {
      params: { workspace: slug, pairing: id },
      body: { kind, seenOn: dayFromNow(now, day), minutes: minutes ?? null },
    });
  }
  await dateNotices(now, proposedOn, plan.waits === undefined);
  return id;
}

/** The season that is over: what was seen, the clutches, and their young with parts by the terms in force. */
async function addPast(now: Date, tubs: readonly TubId[]): Promise<void> {
  let tub = 0;
  for (const [index, past] of pastPairs.entries()) {
    const { started, ovulated, shed, laid, hatched } = past.days;
    const project = past.dam.species === ember.species ? ember : loft;
    const id = await propose(
      {
        key: past.key,
        project,
        sire: past.sire,
        dam: past.dam,
        starts: started,
        ends: ovulated,
        eggs: past.eggs,
        note: 'First clutch of this pair.',
        seen: [
          ['introduction', started],
          ['lock', started + 2, 310],
          ['lock', started + 16, 540],
          ['ovulation', ovulated],
          ['pre_lay_shed', shed],
        ],
      },
      now,
    );
    const young = youngOf.get(past.key) ?? [];
    await withScope({ workspaceId }, async (tx) => {
      const [terms] = await tx
        .select({ id: termsVersions.id })
        .from(termsVersions)
        .where(eq(termsVersions.projectId, project.id));
      if (!terms) throw new Error(`${project.name} has no terms.`);
      await tx.insert(clutches).values({
        workspaceId,
        id: clutchIdOf(past.clutchCode),
        code: `C${dayFromNow(now, laid).slice(2, 4)}-${String(index + 1).padStart(3, '0')}`,
        pairingId: id,
        projectId: project.id,
        termsId: terms.id,
        laidOn: dayFromNow(now, laid),
        eggs: past.eggs,
        slugs: past.slugs,
        clutchGrams: past.eggs * (project === ember ? 88 : 9),
        incubatorLabel: 'I01',
        incubationDecicelsius: project === ember ? 315 : 280,
        hatchedOn: dayFromNow(now, hatched),
      });
      await tx.update(pairings).set({ status: 'ended' }).where(eq(pairings.id, id));
    });
    await addAnimals(young, tubs.slice(tub, tub + young.length), now);
    tub += young.length;
    await withScope({ workspaceId }, (tx) =>
      tx.insert(projectAnimals).values(
        young.map((animal) => ({
          workspaceId,
          projectId: project.id,
          animalId: animalIdOf(animal),
          addedOn: dayFromNow(now, hatched),
        })),
      ),
    );
  }
}

function named(list: readonly Simulated[], name: string): Simulated {
  const found = list.find((animal) => animal.name === name);
  if (!found) throw new Error(`The scenario has no ${name}.`);
  return found;
}

const introduced = (day: number): Seen[] => [
  ['introduction', day],
  ['lock', day + 3, 420],
];

/** Agreed pairings that run, and two that wait for one partner's answer. */
function currentPlans(): Plan[] {
  const cinder = named(bp0, 'Cinder');
  const note = 'Both are in good weight.';
  const python = { project: ember, eggs: 7, note };
  const corn = { project: loft, eggs: 14, note };
  return [
    {
      ...python,
      key: 'ember 1',
      sire: cinder,
      dam: named(bp0, 'Marl'),
      starts: -95,
      ends: -30,
      seen: [
        ...introduced(-95),
        ['lock', -70, 600],
        ['follicles', -52],
        ['ovulation', -34],
        ['pre_lay_shed', -14],
      ],
    },
    {
      ...python,
      key: 'ember 2',
      sire: ofSex(bp2, 'male'),
      dam: named(bp0, 'Saffron'),
      starts: -60,
      ends: 0,
      seen: [...introduced(-60), ['refusal', -41], ['lock', -25, 380]],
    },
    {
      ...python,
      key: 'ember 3',
      sire: named(bp0, 'Sorrel'),
      dam: named(bp0, 'Bramble'),
      starts: -30,
      ends: 40,
      seen: introduced(-30),
    },
    {
      ...corn,
      key: 'loft 1',
      sire: named(cs0, 'Loft'),
      dam: named(cs0, 'Amber'),
      starts: -35,
      ends: -5,
      seen: [...introduced(-35), ['ovulation', -8]],
    },
    {
      ...python,
      key: 'ember 4',
      sire: cinder,
      dam: ofSex(bp1.slice(4), 'female'),
      starts: 9,
      ends: 69,
      waits: tobias,
      seen: [],
    },
    {
      ...corn,
      key: 'loft 2',
      sire: ofSex(cs2, 'male'),
      dam: named(cs0, 'Eave'),
      starts: 14,
      ends: 44,
      waits: tobias,
      seen: [],
    },
  ];
}

/** All pairings of the scenario, the finished season first. */
export async function addSeason(now: Date, tubs: readonly TubId[]): Promise<void> {
  await addPast(now, tubs);
  for (const plan of currentPlans()) await propose(plan, now);
}
