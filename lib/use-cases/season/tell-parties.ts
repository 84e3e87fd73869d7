import 'server-only';
import { listPartiesOfProjects } from '@/db/queries/projects';
import type { PairingFigures } from '@/lib/contracts/pairing-figures';
import { formatMoney } from '@/lib/money/minor-units';
import { configuration } from '@/lib/services/configuration';
import { notifyParties } from '../notify';
import { describeStandings } from '../projects/agreement';
import { queueMail } from '../queue-mail';
import type { WorkspaceWorld } from '../world';
import type { PairingStanding } from './pairing-standing';

/** The address of a pairing's page, opened at the decision. */
const decisionPath = (pairingId: string) => `season/pairings/${pairingId}?decide=1`;

const linkTo = ({ workspace }: WorkspaceWorld, path: string) =>
  `${configuration().appUrl}/${workspace.slug}/${path}`;

/** What a party would get, in one line of the mail. */
function shareLine(figures: PairingFigures, partyId: string | null): string {
  const { proceeds } = figures;
  const share = proceeds.shares.find((one) => one.partyId === partyId);
  const whole = formatMoney(proceeds.expected, proceeds.currency);
  if (proceeds.expected === 0) return 'No proceeds are expected yet: the looks have no prices.';
  return `Expected proceeds ${whole}; yours would be ${formatMoney(share?.amount ?? 0, proceeds.currency)}.`;
}

/** Tells every party of a proposal: in the product, and by mail with a link straight to the decision. */
export async function tellProposal(
  world: WorkspaceWorld,
  { record, versions, partyIds }: PairingStanding,
): Promise<void> {
  const current = versions[0];
  if (!current) return;
  const { figures, number, answerBy } = current.version.row;
  const href = decisionPath(record.id);
  const recipients = await notifyParties(
    world,
    partyIds,
    {
      kind: 'pairing-proposed',
      title: `${world.actor.name} proposes ${figures.title}${number > 1 ? `, version ${number}` : ''}`,
      body: record.projectName,
      href,
    },
    world.actor.memberId,
  );
  for (const recipient of recipients) {
    await queueMail(world, {
      workspaceId: world.workspace.id,
      template: 'pairing-proposed',
      to: recipient.email,
      data: {
        name: recipient.name,
        proposer: world.actor.name,
        project: record.projectName,
        title: figures.title,
        answerBy,
        shareLine: shareLine(figures, recipient.partyId),
        link: linkTo(world, href),
      },
    });
  }
}

/** Tells the other parties what one of them has answered, and whether it is agreed by all now. */
export async function tellDecision(
  world: WorkspaceWorld,
  { record, versions, partyIds }: PairingStanding,
  { decision, comment }: { decision: 'agreed' | 'change_asked'; comment: string },
  locked: boolean,
): Promise<void> {
  const current = versions[0];
  if (!current) return;
  const { figures } = current.version.row;
  const parties = await listPartiesOfProjects(world.tx, [record.projectId]);
  const nameOf = (id: string) => parties.find((party) => party.id === id)?.name ?? 'a party';
  const state = locked ? 'Agreed by all and locked.' : `${describeStandings(current.standings, nameOf)}.`;
  const verb = decision === 'agreed' ? 'agreed to' : 'asks for a change of';
  const recipients = await notifyParties(
    world,
    partyIds,
    {
      kind: 'pairing-decided',
      title: `${world.actor.name} ${verb} ${figures.title}`,
      body: comment || state,
      href: `season/pairings/${record.id}`,
    },
    world.actor.memberId,
  );
  for (const recipient of recipients) {
    await queueMail(world, {
      workspaceId: world.workspace.id,
      template: 'pairing-decided',
      to: recipient.email,
      data: {
        name: recipient.name,
        decider: world.actor.name,
        decision,
        comment,
        project: record.projectName,
        title: figures.title,
        state,
        link: linkTo(world, `season/pairings/${record.id}`),
      },
    });
  }
}
