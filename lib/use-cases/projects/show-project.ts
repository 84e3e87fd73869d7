import 'server-only';
import { findTermsInForce } from '@/db/queries/clutches';
import { listPairingDecisions, listPairingRecords, listPairingVersions } from '@/db/queries/pairings';
import { findProject, listAnimalsOfProject, listPartsInForce } from '@/db/queries/projects';
import { listTermsDecisions, listTermsOf } from '@/db/queries/terms';
import { showProject, type ProjectDetail } from '@/lib/contracts/project';
import { loadBeliefs } from '../genetics/pedigree-beliefs';
import { reachOf } from '../permissions';
import { notFound } from '../refusal';
import { workspaceUseCase, type WorkspaceWorld } from '../world';
import { countAgreed, standingsOf } from './agreement';
import { presentParties, presentProjects } from './present-projects';
import { sumHoldings } from './sum-holdings';

/** A member reads a joint project: who is in it, what stands in it, and what was agreed. */
export const showProjectUseCase = workspaceUseCase(showProject, async (world, { params }) => {
  const { tx, sees, actor } = world;
  const record = await findProject(tx, sees, params.project);
  const [row] = record ? await presentProjects(world, [record]) : [];
  if (!record || !row) throw notFound('project');
  const animals = await listAnimalsOfProject(tx, record.id);
  const held = await listPartsInForce(
    tx,
    animals.map(({ id }) => id),
  );
  const partsOf = (animalId: string) =>
    held.filter((part) => part.animalId === animalId).map(({ partyId, parts }) => ({ partyId, parts }));
  const beliefs = await loadBeliefs(tx, record.speciesId);
  return {
    ...row,
    version: record.version,
    holdings: sumHoldings(animals.map(({ id }) => partsOf(id))),
    animalRows: animals.map(({ weighedOn: _weighedOn, ...animal }) => ({
      ...animal,
      description: beliefs.describe(animal.id),
      parts: partsOf(animal.id),
    })),
    ...(reachOf(actor.role, 'terms.see') === 'no' ? {} : { terms: await loadTermsLines(world, row) }),
    pairingRows: reachOf(actor.role, 'pairing.see') === 'no' ? [] : await loadPairingLines(world, row),
  };
});

type Row = Pick<ProjectDetail, 'id' | 'parties'>;

async function loadTermsLines(
  { tx, today }: WorkspaceWorld,
  { id, parties }: Row,
): Promise<NonNullable<ProjectDetail['terms']>> {
  const versions = await listTermsOf(tx, [id]);
  const inForce = await findTermsInForce(tx, id, today);
  const decisions = await listTermsDecisions(
    tx,
    versions.map((version) => version.id),
  );
  return versions.map(({ id: termsId, number, status, inForceFrom, content }) => {
    const partyIds =
      'parties' in content && status === 'agreed'
        ? content.parties.map((party) => party.id)
        : presentParties(parties).map((party) => party.id);
    const standings = standingsOf(
      partyIds,
      decisions.filter(({ subjectId }) => subjectId === termsId),
    );
    return {
      id: termsId,
      number,
      status,
      inForceFrom,
      inForce: inForce?.id === termsId,
      ...countAgreed(standings),
    };
  });
}

async function loadPairingLines(
  { tx, sees }: WorkspaceWorld,
  { id, parties }: Row,
): Promise<ProjectDetail['pairingRows']> {
  const records = (await listPairingRecords(tx, sees, { project: id })).filter(
    ({ status }) => status !== 'withdrawn',
  );
  const versions = await listPairingVersions(
    tx,
    records.map((record) => record.id),
  );
  const decisions = await listPairingDecisions(
    tx,
    versions.map(({ row }) => row.id),
  );
  const partyIds = presentParties(parties).map((party) => party.id);
  return records
    .sort((a, b) => b.season - a.season)
    .map((record) => {
      const latest = versions.find(({ row }) => row.pairingId === record.id);
      const standings = standingsOf(
        partyIds,
        decisions.filter(({ subjectId }) => subjectId === latest?.row.id),
      );
      return {
        id: record.id,
        season: record.season,
        title: latest?.row.figures.title ?? `${record.sireCode} × ${record.damCode}`,
        status: record.status,
        sireCode: record.sireCode,
        damCode: record.damCode,
        ...countAgreed(standings),
      };
    });
}
