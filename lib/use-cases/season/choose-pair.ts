import 'server-only';
import { findAnimals } from '@/db/queries/animals';
import { isPairedInSeason } from '@/db/queries/pairings';
import { findProject } from '@/db/queries/projects';
import { findSpecies } from '@/db/queries/species';
import type { AnimalId, PairingId, ProjectId } from '@/lib/contracts/ids';
import type { SpeciesProfile } from '@/lib/contracts/species';
import { addDays } from '@/lib/season/days';
import { forecastSeason } from '@/lib/season/forecast';
import { notFound, Refusal, type FieldError } from '../refusal';
import type { WorkspaceWorld } from '../world';

export interface PairRequest {
  projectId: ProjectId;
  sireId: AnimalId;
  damId: AnimalId;
}

/**
 * The project and the two animals of a pairing, as far as the caller sees them.
 * @throws {Refusal} 'not_found' for the project, 'invalid' for an animal that can't be it
 */
export async function choosePair({ tx, sees }: WorkspaceWorld, { projectId, sireId, damId }: PairRequest) {
  const project = await findProject(tx, sees, projectId);
  if (!project) throw notFound('project');
  const species = await findSpecies(tx, project.speciesId);
  if (!species) throw notFound('species');
  const animals = await findAnimals(tx, sees, [sireId, damId]);
  const errors: FieldError[] = [];
  const pick = (id: AnimalId, field: 'sireId' | 'damId', sex: 'male' | 'female') => {
    const animal = animals.find((one) => one.id === id);
    if (!animal) errors.push({ field, message: 'There is no such animal here, or you may not see it.' });
    else if (animal.speciesId !== project.speciesId)
      errors.push({ field, message: `${animal.code} is of another species than the project.` });
    else if (animal.sex !== sex)
      errors.push({ field, message: `${animal.code} is not ${sex === 'male' ? 'a male' : 'a female'}.` });
    else if (!['here', 'on_loan', 'quarantine'].includes(animal.status))
      errors.push({ field, message: `${animal.code} is not here any more.` });
    return animal;
  };
  const sire = pick(sireId, 'sireId', 'male');
  const dam = pick(damId, 'damId', 'female');
  if (errors.length || !sire || !dam)
    throw new Refusal('invalid', errors[0]?.message ?? 'Choose a sire and a dam.', { errors });
  return { project, species, sire, dam };
}

/** The year in which the young of a pairing are expected. */
export function seasonOf(
  plan: { startsOn: string; endsOn: string },
  { intervals, bearing }: SpeciesProfile,
): number {
  const { hatching } = forecastSeason({ plan, events: [], clutch: null, bearing }, intervals, plan.startsOn);
  return Number((hatching?.usual ?? plan.startsOn).slice(0, 4));
}

/** The days of a plan that leaves them open: from next week for as long as the species usually takes to ovulate. */
export function usualDays(
  today: string,
  { intervals }: SpeciesProfile,
  given: { startsOn?: string; endsOn?: string },
) {
  const startsOn = given.startsOn ?? addDays(today, 7);
  const endsOn = given.endsOn ?? addDays(startsOn, intervals.pairingToOvulation.usual);
  return { startsOn, endsOn: endsOn < startsOn ? startsOn : endsOn };
}

/** What keeps a pairing from being proposed. */
export async function findObstacles(
  { tx, today }: WorkspaceWorld,
  pair: {
    project: { id: ProjectId; endedOn: string | null };
    sire: { id: AnimalId; code: string };
    dam: { id: AnimalId; code: string };
  },
  { season, hasTerms, except }: { season: number; hasTerms: boolean; except?: PairingId },
): Promise<FieldError[]> {
  const obstacles: FieldError[] = [];
  if (pair.project.endedOn && pair.project.endedOn <= today)
    obstacles.push({ field: 'projectId', message: `This project ended on ${pair.project.endedOn}.` });
  if (!hasTerms)
    obstacles.push({
      field: 'projectId',
      message: 'No terms are agreed for the first day of this pairing. Agree on terms of the project first.',
    });
  if (await isPairedInSeason(tx, { sireId: pair.sire.id, damId: pair.dam.id }, season, except)) {
    obstacles.push({
      field: 'damId',
      message: `${pair.sire.code} and ${pair.dam.code} are already paired in the season of ${season}.`,
    });
  }
  return obstacles;
}
