import 'server-only';
import { clutchCodesStartingWith, findTermsInForce, insertClutch } from '@/db/queries/clutches';
import { findPairingForLog } from '@/db/queries/pairing-events';
import { layClutch } from '@/lib/contracts/clutch';
import { recordAudit } from '../audit';
import { invalid, notFound, Refusal } from '../refusal';
import { workspaceUseCase } from '../world';
import { nextCodes } from './next-code';

/**
 * The laying of a clutch is logged. The clutch takes the project's terms that are in force on that day and keeps
 * them, whatever is agreed later.
 */
export const layClutchUseCase = workspaceUseCase(layClutch, async (world, { params, body }) => {
  const { tx, sees, workspace, today } = world;
  const pairing = await findPairingForLog(tx, sees, params.pairing);
  if (!pairing) throw notFound('pairing');
  if (pairing.status !== 'agreed')
    throw new Refusal('wrong_state', 'Only an agreed pairing can have a clutch.');
  if (body.laidOn > today) throw invalid('laidOn', 'This day has not come yet.');
  const terms = await findTermsInForce(tx, pairing.projectId, body.laidOn);
  if (!terms)
    throw invalid('laidOn', 'The project had no agreed terms on this day, so nobody would own the young.');
  const start = `C${body.laidOn.slice(2, 4)}-`;
  const [code = `${start}001`] = nextCodes(start, await clutchCodesStartingWith(tx, start), 1, 3);
  const id = await insertClutch(tx, {
    ...body,
    workspaceId: workspace.id,
    code,
    pairingId: pairing.id,
    projectId: pairing.projectId,
    termsId: terms.id,
  });
  await recordAudit(world, {
    action: 'clutch.lay',
    subject: { kind: 'clutch', id },
    detail: {
      code,
      pairingId: pairing.id,
      laidOn: body.laidOn,
      eggs: body.eggs,
      slugs: body.slugs,
      termsId: terms.id,
    },
  });
  return { id, code };
});
