import { projectAnimals, projectParties, projects } from '@/db/schema/projects';
import { withScope } from '@/db/scope';
import type { ProjectId } from '@/lib/contracts/ids';
import type { TermsDraft } from '@/lib/contracts/terms-content';
import { decideTermsUseCase } from '@/lib/use-cases/projects/decide-terms';
import { proposeTermsUseCase } from '@/lib/use-cases/projects/propose-terms';
import { perform } from '@/lib/use-cases/perform';
import { dayFromNow } from '../calendar';
import { identify } from '../identify';
import { animalIdOf } from './collection';
import { housePartyId, slug, workspaceId } from './house';
import { bp0, bp1, bp2, cs0, cs1, cs2, sides } from './lineage';
import { dateNotices } from './notices';
import { ilse, maren, tobias, type DemoPerson } from './people';
import { callerOf, liveAt } from './live-at';
import type { Simulated } from './simulate';
import { corns, pythons, type SownSpecies } from './species';

/** Days from the day of seeding on which the partners began. */
const STARTED = -1200;

export interface SownProject {
  id: ProjectId;
  name: string;
  purpose: string;
  species: SownSpecies;
  partners: DemoPerson[];
  animals: readonly Simulated[];
  terms: TermsDraft;
}

const clauses = {
  death: 'A death is told to all partners within two days; nobody owes a replacement.',
  exit: 'Whoever leaves offers their parts to the other partners first, at the price of the last sale of its kind.',
  notice: 'Thirty days, in writing.',
};

export const ember: SownProject = {
  id: identify<ProjectId>('project ember pieds'),
  name: 'Ember pieds',
  purpose: 'Pied ball pythons with warm pastel colours, from Cinder and Saffron.',
  species: pythons,
  partners: [maren, tobias, ilse],
  animals: [...bp0.filter(({ name }) => name !== 'Wick'), ...bp1, ...bp2],
  terms: {
    ...sides.pythons,
    houseShare: { partyId: housePartyId, basisPoints: 1000 },
    costsFirst: true,
    cardFees: 'off_the_top',
    division: 'proceeds',
    clauses,
  },
};

export const loft: SownProject = {
  id: identify<ProjectId>('project loft ambers'),
  name: 'Loft ambers',
  purpose: 'Amelanistic and lavender corn snakes of one calm line.',
  species: corns,
  partners: [maren, tobias],
  animals: [...cs0.filter(({ name }) => name !== 'Joist'), ...cs1, ...cs2],
  terms: {
    ...sides.corns,
    houseShare: null,
    costsFirst: false,
    cardFees: 'off_the_top',
    division: 'proceeds',
    clauses,
  },
};

async function addProject(project: SownProject, now: Date): Promise<void> {
  const { id, name, purpose, species, partners, animals } = project;
  const startedOn = dayFromNow(now, STARTED);
  await withScope({ workspaceId }, async (tx) => {
    await tx.insert(projects).values({ workspaceId, id, name, purpose, speciesId: species.id, startedOn });
    for (const [index, { partyId }] of partners.entries()) {
      if (partyId)
        await tx
          .insert(projectParties)
          .values({ workspaceId, projectId: id, partyId, rank: index + 1, joinedOn: startedOn });
    }
    await tx.insert(projectAnimals).values(
      animals.map((animal) => ({
        workspaceId,
        projectId: id,
        animalId: animalIdOf(animal),
        addedOn: dayFromNow(now, Math.max(STARTED, animal.hatched)),
      })),
    );
  });
}

/** The two joint projects; one partner proposes the terms, the others agree some days later, which locks them. */
export async function addProjects(now: Date): Promise<void> {
  for (const project of [ember, loft]) {
    await addProject(project, now);
    const [first, ...others] = project.partners;
    if (!first) continue;
    liveAt(now, STARTED);
    const { id: terms } = await perform(proposeTermsUseCase, callerOf(first, `terms ${project.name}`), {
      params: { workspace: slug, project: project.id },
      body: {
        content: project.terms,
        inForceFrom: dayFromNow(now, STARTED),
        note: 'As we talked it over.',
      },
    });
    for (const [index, partner] of others.entries()) {
      liveAt(now, STARTED + 2 + index);
      await perform(decideTermsUseCase, callerOf(partner), {
        params: { workspace: slug, project: project.id, terms },
        body: { decision: 'agreed' },
      });
    }
    await dateNotices(now, STARTED, true);
  }
}
