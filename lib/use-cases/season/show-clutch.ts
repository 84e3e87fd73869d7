import 'server-only';
import { codesStartingWith, findClutch, listYoung } from '@/db/queries/clutches';
import { loadSpeciesForComputing } from '@/db/queries/lineage';
import { showClutch } from '@/lib/contracts/clutch';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { crossPair } from './cross-pair';
import { nextCodes } from './next-code';
import { deriveParts, presentClutch } from './present-clutch';

/** A member opens a clutch: its facts, what may hatch, whose the young are, and the young that are logged. */
export const showClutchUseCase = workspaceUseCase(showClutch, async (world, { params }) => {
  const { tx, sees, today } = world;
  const clutch = await findClutch(tx, sees, params.clutch);
  const computing = clutch && (await loadSpeciesForComputing(tx, clutch.speciesId));
  if (!clutch || !computing) throw notFound('clutch');
  const beliefs = await loadBeliefs(tx, clutch.speciesId);
  const { table } = crossPair(beliefs, clutch, Math.max(1, clutch.eggs), computing.combinations);
  const { terms, parts, steps } = await deriveParts(world, clutch);
  const young = await listYoung(tx, clutch.id);
  const start = `${clutch.codePrefix}-${(clutch.hatchedOn ?? today).slice(2, 4)}-`;
  const left = Math.min(120, Math.max(1, clutch.eggs - clutch.hatchlings));
  return {
    ...presentClutch(clutch, beliefs, today),
    version: clutch.version,
    clutchGrams: clutch.clutchGrams,
    note: clutch.note,
    terms: { id: terms.id, number: terms.number, inForceFrom: terms.inForceFrom },
    possibleLooks: table.rows.map(({ key, looksLike, sex, probability, odds, phenotypes }) => ({
      key,
      label: sex ? `${looksLike}, ${sex}` : looksLike,
      probability,
      odds,
      shows: { ...phenotypes },
    })),
    derivation: { parts, steps },
    young: young.map(({ status, ...row }) => ({
      ...row,
      looksLike: beliefs.describe(row.id),
      alive: status !== 'died',
    })),
    proposedCodes: nextCodes(start, await codesStartingWith(tx, start), left, 3),
  };
});
