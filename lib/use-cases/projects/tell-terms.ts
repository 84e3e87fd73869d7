import 'server-only';
import type { TermsRecord } from '@/db/queries/terms';
import type { ProjectId, TermsId } from '@/lib/contracts/ids';
import { configuration } from '@/lib/services/configuration';
import { notifyParties } from '../notify';
import { notFound } from '../refusal';
import { queueMail } from '../queue-mail';
import type { WorkspaceWorld } from '../world';
import { describeStandings, type Standing } from './agreement';
import { loadTermsStandings, versionBefore } from './terms-standing';
import { compareClauses, termsWords } from './terms-words';

const pathOf = (record: Pick<TermsRecord, 'projectId' | 'id'>) =>
  `projects/${record.projectId}/terms/${record.id}`;
const linkTo = ({ workspace }: WorkspaceWorld, path: string) =>
  `${configuration().appUrl}/${workspace.slug}/${path}`;

/** Tells every party of proposed terms: in the product, and by mail with what changes and a link to the decision. */
export async function tellTermsProposal(
  world: WorkspaceWorld,
  projectId: ProjectId,
  id: TermsId,
): Promise<void> {
  const { versions, nameOf } = await loadTermsStandings(world, projectId);
  const record = versions.find((version) => version.record.id === id)?.record;
  if (!record) throw notFound('version of terms');
  const before = versionBefore(versions, record.number);
  const clauses = compareClauses(
    termsWords(record.content, nameOf),
    before ? termsWords(before.content, nameOf) : null,
  );
  const changes = before
    ? clauses
        .filter(({ changed }) => changed)
        .map(({ title, before: was, text }) => `${title}: ${was ?? ''} → ${text}`)
    : clauses.map(({ title, text }) => `${title}: ${text}`);
  const href = `${pathOf(record)}?decide=1`;
  const recipients = await notifyParties(
    world,
    record.content.parties.map((party) => party.id),
    {
      kind: 'terms-proposed',
      title: `${world.actor.name} proposes terms version ${record.number} of ${record.projectName}`,
      body: record.note,
      href,
    },
    world.actor.memberId,
  );
  for (const recipient of recipients) {
    await queueMail(world, {
      workspaceId: world.workspace.id,
      template: 'terms-proposed',
      to: recipient.email,
      data: {
        name: recipient.name,
        proposer: world.actor.name,
        project: record.projectName,
        number: record.number,
        changes,
        link: linkTo(world, href),
      },
    });
  }
}

/** Tells the other parties what one of them has answered to proposed terms. */
export async function tellTermsDecision(
  world: WorkspaceWorld,
  record: TermsRecord,
  standings: readonly Standing[],
  { decision, comment }: { decision: 'agreed' | 'change_asked'; comment: string },
  locked: boolean,
): Promise<void> {
  const { nameOf } = await loadTermsStandings(world, record.projectId);
  const state = locked
    ? `Agreed by all and locked; in force from ${record.inForceFrom}.`
    : `${describeStandings(standings, nameOf)}.`;
  const verb = decision === 'agreed' ? 'agreed to' : 'asks for a change of';
  const recipients = await notifyParties(
    world,
    record.content.parties.map((party) => party.id),
    {
      kind: 'terms-decided',
      title: `${world.actor.name} ${verb} terms version ${record.number} of ${record.projectName}`,
      body: comment || state,
      href: pathOf(record),
    },
    world.actor.memberId,
  );
  for (const recipient of recipients) {
    await queueMail(world, {
      workspaceId: world.workspace.id,
      template: 'terms-decided',
      to: recipient.email,
      data: {
        name: recipient.name,
        decider: world.actor.name,
        decision,
        comment,
        project: record.projectName,
        number: record.number,
        state,
        link: linkTo(world, pathOf(record)),
      },
    });
  }
}
