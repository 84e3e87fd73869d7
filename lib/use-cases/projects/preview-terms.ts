import 'server-only';
import { findProject, listAnimalsOfProject, listPartsInForce } from '@/db/queries/projects';
import type { PartyId } from '@/lib/contracts/ids';
import { previewTerms } from '@/lib/contracts/terms';
import { notFound } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { completeTerms } from './draft-terms';
import { partsOfYoung, splitSale } from './split-by-terms';
import { loadTermsStandings, versionBefore } from './terms-standing';
import { compareClauses, termsWords } from './terms-words';

/** A party tries out drafted terms on an example sale. Nothing is written. */
export const previewTermsUseCase = workspaceUseCase(previewTerms, async (world, { params, body }) => {
  const project = await findProject(world.tx, world.sees, params.project);
  if (!project) throw notFound('project');
  const { content, nameOf } = await completeTerms(world, project.id, body.content);
  const parents = await chooseExample(
    world,
    project.id,
    content.parties.map(({ id }) => id),
  );
  const { versions, nameOf: earlierName } = await loadTermsStandings(world, project.id);
  const before = versionBefore(versions, Number.MAX_SAFE_INTEGER);
  const sale = {
    price: body.price,
    cardFee: body.cardFee,
    costs: body.costs,
    costsPaidBy: content.parties[0]?.id ?? null,
  };
  return {
    example: parents.words,
    steps: splitSale(content, partsOfYoung(content, parents), sale, nameOf),
    clauses: compareClauses(
      termsWords(content, nameOf),
      before ? termsWords(before.content, earlierName) : null,
    ),
    comparedWith: before?.number ?? null,
  };
});

/** A dam and a sire of the project, or made-up ones of its first two parties where it has none. */
async function chooseExample(
  { tx }: WorkspaceWorld,
  projectId: Parameters<typeof listAnimalsOfProject>[1],
  partyIds: readonly PartyId[],
) {
  const animals = await listAnimalsOfProject(tx, projectId);
  const held = await listPartsInForce(
    tx,
    animals.map(({ id }) => id),
  );
  const partsOf = (id: string) =>
    held.filter(({ animalId }) => animalId === id).map(({ partyId, parts }) => ({ partyId, parts }));
  const ofSex = (sex: 'male' | 'female') =>
    animals.filter((animal) => animal.sex === sex && partsOf(animal.id).length > 0);
  // The pair with the most owners shows most of what the terms do.
  const owners = (ids: readonly string[]) =>
    new Set(ids.flatMap((id) => partsOf(id).map(({ partyId }) => partyId))).size;
  const [best] = ofSex('female')
    .flatMap((dam) => ofSex('male').map((sire) => ({ dam, sire, owners: owners([dam.id, sire.id]) })))
    .sort((a, b) => b.owners - a.owners);
  const { dam, sire } = best ?? { dam: undefined, sire: undefined };
  const whole = (id: PartyId | undefined) => (id ? [{ partyId: id, parts: 1 }] : []);
  if (dam && sire)
    return {
      dam: partsOf(dam.id),
      sire: partsOf(sire.id),
      words: `A young of ${sire.code} × ${dam.code}, by their owners of today`,
    };
  return {
    dam: whole(partyIds[0]),
    sire: whole(partyIds[1]),
    words: 'A young of a dam of the first party and a sire of the second',
  };
}
