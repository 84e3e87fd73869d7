import 'server-only';
import { findClutch, findTermsById, updateClutch } from '@/db/queries/clutches';
import { editClutch } from '@/lib/contracts/clutch';
import { recordAudit } from '../audit';
import { invalid, notFound, stale } from '../refusal';
import { workspaceUseCase } from '../world';

/** What is recorded of a clutch is corrected or added to; its terms stay. */
export const editClutchUseCase = workspaceUseCase(editClutch, async (world, { params, body }) => {
  const { tx, sees, today } = world;
  const clutch = await findClutch(tx, sees, params.clutch);
  if (!clutch) throw notFound('clutch');
  const { version, ...fields } = body;
  if (fields.laidOn > today) throw invalid('laidOn', 'This day has not come yet.');
  if (clutch.hatchedOn && fields.laidOn >= clutch.hatchedOn)
    throw invalid('laidOn', 'It hatched before this day.');
  if (fields.eggs < clutch.hatchlings)
    throw invalid('eggs', `${clutch.hatchlings} young are logged; there were at least as many eggs.`);
  const terms = await findTermsById(tx, clutch.termsId);
  if (terms && fields.laidOn < terms.inForceFrom) {
    throw invalid(
      'laidOn',
      `The clutch stands under terms version ${terms.number}, in force from ${terms.inForceFrom}.`,
    );
  }
  if (!(await updateClutch(tx, clutch.id, version, fields))) throw stale('clutch', clutch.version);
  await recordAudit(world, {
    action: 'clutch.edit',
    subject: { kind: 'clutch', id: clutch.id },
    detail: fields,
  });
  return { version: version + 1 };
});
