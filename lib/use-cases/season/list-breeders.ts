import 'server-only';
import { idsInProject, listBreedersOf, listLatestWeights } from '@/db/queries/pairing-breeders';
import { findProject, listPartsInForce } from '@/db/queries/projects';
import { findSpecies } from '@/db/queries/species';
import { listBreeders } from '@/lib/contracts/season';
import { wholeMonths } from '@/lib/season/days';
import { checkReadiness } from '@/lib/season/readiness';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { limitsFor } from './pair-warnings';

/** A member looks which animals could be paired in a project; those that stand in it come first. */
export const listBreedersUseCase = workspaceUseCase(
  listBreeders,
  async ({ tx, sees, workspace, today }, { query }) => {
    const project = await findProject(tx, sees, query.project);
    const species = project ? await findSpecies(tx, project.speciesId) : null;
    if (!project || !species) throw notFound('project');
    const animals = await listBreedersOf(tx, sees, species.id);
    const ids = animals.map(({ id }) => id);
    const inProject = await idsInProject(tx, project.id);
    const weights = new Map((await listLatestWeights(tx, ids)).map((weight) => [weight.animalId, weight]));
    const held = await listPartsInForce(tx, ids);
    const beliefs = await loadBeliefs(tx, species.id);
    const rows = animals.map((animal) => {
      const weight = weights.get(animal.id);
      const sex = animal.sex === 'male' ? ('male' as const) : ('female' as const);
      const measured = {
        code: animal.code,
        sex,
        hatchedOn: animal.hatchedOn,
        grams: weight?.grams ?? null,
        weighedOn: weight?.weighedOn ?? null,
      };
      return {
        sex,
        breeder: {
          id: animal.id,
          code: animal.code,
          name: animal.name,
          description: beliefs.describe(animal.id),
          inProject: inProject.has(animal.id),
          ageMonths: animal.hatchedOn ? wholeMonths(animal.hatchedOn, today) : null,
          grams: measured.grams,
          warnings: checkReadiness(measured, limitsFor(sex, workspace.limits, species.profile), today).map(
            ({ text }) => text,
          ),
          parts: held
            .filter(({ animalId }) => animalId === animal.id)
            .map(({ partyId, parts }) => ({ partyId, parts })),
        },
      };
    });
    const ofSex = (sex: 'male' | 'female') =>
      rows
        .filter((row) => row.sex === sex)
        .map(({ breeder }) => breeder)
        .sort((a, b) => Number(b.inProject) - Number(a.inProject));
    return { sires: ofSex('male'), dams: ofSex('female') };
  },
);
