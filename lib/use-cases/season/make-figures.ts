import 'server-only';
import { findTermsInForce } from '@/db/queries/clutches';
import { loadPedigree, loadSpeciesForComputing, visibleIdsOfSpecies } from '@/db/queries/lineage';
import { listRefusals } from '@/db/queries/pairings';
import { listPartiesOfProjects, listPartsInForce, type ProjectRecord } from '@/db/queries/projects';
import { listLatestWeights } from '@/db/queries/pairing-breeders';
import type { AnimalId } from '@/lib/contracts/ids';
import type { PairingFigures, ParentFigures } from '@/lib/contracts/pairing-figures';
import { wholeMonths } from '@/lib/season/days';
import { drawnCopies } from '../genetics/copies';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';
import { notFound } from '../refusal';
import type { WorkspaceWorld } from '../world';
import { cautionsOf, crossPair, explainUncertainty, type CrossedPair } from './cross-pair';
import { loadEarlierPrices, lookKey } from './earlier-prices';
import { expectProceeds } from './expect-proceeds';
import { pairWarnings } from './pair-warnings';
import { relationFigures } from './relation-figures';
import { splitByTerms } from './split-by-terms';
import { squareFigures } from './square-figures';

export interface ChosenPair {
  project: ProjectRecord;
  sire: { id: AnimalId; code: string; name: string; hatchedOn: string | null };
  dam: ChosenPair['sire'];
  startsOn: string;
  eggsExpected: number | null;
  /** Null takes the medians of earlier sales. */
  prices: Readonly<Record<string, number>> | null;
}

export interface MadeFigures {
  figures: Omit<PairingFigures, 'termsId' | 'termsNumber'> & {
    termsId: PairingFigures['termsId'] | null;
    termsNumber: number | null;
  };
  prices: Record<string, number>;
  /** Outcome keys whose price is a median, with how many sales it stands on. */
  medians: Record<string, number>;
}

/**
 * Everything that the parties see of a pairing before they answer, computed in one place for the preview and for the
 * proposal: what can hatch, the parents, how related they are, what it would be worth, and to whom.
 */
export async function makeFigures(world: WorkspaceWorld, chosen: ChosenPair): Promise<MadeFigures> {
  const { tx, workspace } = world;
  const { project, sire, dam, startsOn } = chosen;
  const computing = await loadSpeciesForComputing(tx, project.speciesId);
  if (!computing) throw notFound('species');
  const { profile } = computing.species;
  const beliefs = await loadBeliefs(tx, project.speciesId);
  const eggs = chosen.eggsExpected ?? Math.max(1, Math.round(profile.clutchSize.usual));
  const pair = crossPair(beliefs, { sireId: sire.id, damId: dam.id }, eggs, computing.combinations);
  const parents = await describeParents(world, chosen, beliefs, pair);

  const pedigree = await loadPedigree(tx, project.speciesId);
  const inProject = await visibleIdsOfSpecies(
    tx,
    { everything: false, partyId: null, projectIds: [project.id] },
    project.speciesId,
  );
  const relation = relationFigures(pedigree.rows, pair, (id) => inProject.has(id as AnimalId));
  const refusals = await listRefusals(tx, [sire.id, dam.id]);

  const earlier = await loadEarlierPrices(world, project.speciesId, beliefs);
  const { prices, medians } = choosePrices(pair, chosen.prices, earlier);
  const outcomes = pair.table.rows.map(({ key, looksLike, carries, odds, probability, atLeastOne, sex }) => ({
    key,
    looksLike,
    carries,
    odds,
    probability,
    atLeastOne,
    sex,
    price: prices[key] ?? null,
  }));
  const { proceeds, hatchlings } = expectProceeds(outcomes, {
    eggs,
    hatchRate: profile.hatchRate.fraction,
    lethal: pair.table.lethal,
  });

  const terms = await findTermsInForce(tx, project.id, startsOn);
  const parties = (await listPartiesOfProjects(tx, [project.id])).map(({ id, name }) => ({ id, name }));
  const split = terms
    ? splitByTerms(terms.content, { sire: parents.sire.parts, dam: parents.dam.parts }, proceeds, parties)
    : { steps: [], shares: [], youngParts: { parts: [], steps: [] } };
  const names = { sire: sire.code, dam: dam.code };
  const { description: sireWords } = parents.sire;
  const { description: damWords } = parents.dam;
  return {
    prices,
    medians,
    figures: {
      title: `${sireWords} × ${damWords}`,
      sire: { id: sire.id, code: sire.code, description: sireWords },
      dam: { id: dam.id, code: dam.code, description: damWords },
      parents,
      outcomes,
      leftOut: pair.table.notShown < 1e-9 ? 0 : pair.table.notShown,
      squares: squareFigures(pair, beliefs.sexSystem, names),
      uncertain: explainUncertainty(pair, names, eggs, beliefs.sexSystem),
      lethal: pair.table.lethal,
      inbreeding: relation.inbreeding,
      commonAncestors: relation.commonAncestors,
      eggsExpected: eggs,
      hatchlingsExpected: hatchlings,
      warnings: pairWarnings(parents, {
        limits: workspace.limits,
        profile,
        onDay: startsOn,
        relation,
        refusals,
      }),
      cautions: cautionsOf(pair),
      termsId: terms?.id ?? null,
      termsNumber: terms?.number ?? null,
      youngParts: split.youngParts,
      proceeds: {
        expected: proceeds,
        currency: workspace.currency,
        steps: split.steps,
        shares: split.shares,
      },
    },
  };
}

async function describeParents(
  { tx }: WorkspaceWorld,
  { sire, dam, startsOn }: ChosenPair,
  beliefs: SpeciesBeliefs,
  { loci }: CrossedPair,
): Promise<PairingFigures['parents']> {
  const held = await listPartsInForce(tx, [sire.id, dam.id]);
  const weights = await listLatestWeights(tx, [sire.id, dam.id]);
  const describe = (parent: ChosenPair['sire']): ParentFigures => {
    const weight = weights.find(({ animalId }) => animalId === parent.id);
    return {
      id: parent.id,
      code: parent.code,
      name: parent.name,
      description: beliefs.describe(parent.id),
      hatchedOn: parent.hatchedOn,
      ageMonths: parent.hatchedOn ? wholeMonths(parent.hatchedOn, startsOn) : null,
      grams: weight?.grams ?? null,
      weighedOn: weight?.weighedOn ?? null,
      parts: held
        .filter(({ animalId }) => animalId === parent.id)
        .map(({ partyId, parts }) => ({ partyId, parts })),
      loci: loci.map((locus) => {
        const belief = beliefs.belief(parent.id, locus.id);
        return {
          locusId: locus.id,
          name: locus.name,
          ...drawnCopies(beliefs, belief),
          words: beliefs.words(belief),
        };
      }),
    };
  };
  return { sire: describe(sire), dam: describe(dam) };
}

/** Prices as given, or medians of earlier sales of the same look. */
function choosePrices(
  { table }: CrossedPair,
  given: ChosenPair['prices'],
  earlier: Awaited<ReturnType<typeof loadEarlierPrices>>,
): Pick<MadeFigures, 'prices' | 'medians'> {
  const prices: Record<string, number> = {};
  const medians: Record<string, number> = {};
  for (const { key } of table.rows) {
    const before = earlier.get(lookKey(key));
    if (given) {
      if (given[key] !== undefined) prices[key] = given[key];
    } else if (before) {
      prices[key] = before.median;
    }
    if (before && prices[key] === before.median) medians[key] = before.sales;
  }
  return { prices, medians };
}
