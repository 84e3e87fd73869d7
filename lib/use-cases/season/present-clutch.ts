import 'server-only';
import { findTermsById, partsOn, type ClutchRecord } from '@/db/queries/clutches';
import { listPartiesOfProjects } from '@/db/queries/projects';
import type { ClutchRow } from '@/lib/contracts/clutch';
import { addDays } from '@/lib/season/days';
import type { SpeciesBeliefs } from '../genetics/species-beliefs';
import { partsOfYoung } from '../projects/split-by-terms';
import { notFound } from '../refusal';
import type { WorkspaceWorld } from '../world';

/** When the first egg may pip, from the day of laying and the species' incubation. */
function expectPip({ laidOn, profile }: ClutchRecord): NonNullable<ClutchRow['pipExpected']> {
  const { from, usual, to } = profile.intervals.incubation;
  return { from: addDays(laidOn, from), usual: addDays(laidOn, usual), to: addDays(laidOn, to) };
}

/** A clutch as a row of the list. */
export function presentClutch(clutch: ClutchRecord, beliefs: SpeciesBeliefs, today: string): ClutchRow {
  const pip = expectPip(clutch);
  const open = clutch.eggs === 0 ? 'lost' : today >= pip.from ? 'hatching' : 'incubating';
  return {
    id: clutch.id,
    code: clutch.code,
    pairingId: clutch.pairingId,
    project: { id: clutch.projectId, name: clutch.projectName },
    sire: { id: clutch.sireId, code: clutch.sireCode, description: beliefs.describe(clutch.sireId) },
    dam: { id: clutch.damId, code: clutch.damCode, description: beliefs.describe(clutch.damId) },
    laidOn: clutch.laidOn,
    eggs: clutch.eggs,
    slugs: clutch.slugs,
    incubatorLabel: clutch.incubatorLabel,
    incubationDecicelsius: clutch.incubationDecicelsius,
    pipExpected: clutch.hatchedOn || clutch.eggs === 0 ? null : pip,
    hatchedOn: clutch.hatchedOn,
    hatchlings: clutch.hatchlings,
    state: clutch.hatchedOn ? 'hatched' : open,
  };
}

/**
 * Whose the young of a clutch are: by the parents' owners on the day of laying and the terms that the clutch stands
 * under, with the steps in words. No parts when no parent had a recorded owner on that day.
 */
export async function deriveParts({ tx }: Pick<WorkspaceWorld, 'tx'>, clutch: ClutchRecord) {
  const terms = await findTermsById(tx, clutch.termsId);
  if (!terms) throw notFound('terms');
  const sire = await partsOn(tx, clutch.sireId, clutch.laidOn);
  const dam = await partsOn(tx, clutch.damId, clutch.laidOn);
  const parties = await listPartiesOfProjects(tx, [clutch.projectId]);
  const nameOf = (id: string) => parties.find((party) => party.id === id)?.name ?? 'Another party';
  const young = partsOfYoung(terms.content, { sire, dam });
  const of = young.reduce((sum, { parts }) => sum + parts, 0);
  return {
    terms,
    partyIds: parties.filter(({ leftOn }) => leftOn === null).map(({ id }) => id),
    parts: young.map(({ partyId, parts }) => ({ partyId, parts })),
    steps: [
      `Terms version ${terms.number}, in force when the clutch was laid on ${clutch.laidOn}: dam side ${terms.content.damSide}, sire side ${terms.content.sireSide}`,
      ...young.map(
        ({ partyId, parts, why }) => `${nameOf(partyId)}: ${parts} of ${of}, ${why.join(' and ')}`,
      ),
    ],
  };
}
