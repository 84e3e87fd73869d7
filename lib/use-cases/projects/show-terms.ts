import 'server-only';
import { findTermsInForce } from '@/db/queries/clutches';
import { findTerms } from '@/db/queries/terms';
import { showTerms } from '@/lib/contracts/terms';
import { reachOf } from '../permissions';
import { notFound } from '../refusal';
import { workspaceUseCase } from '../world';
import { presentStandings } from './present-standings';
import { presentTerms } from './present-terms';
import { loadTermsStandings, versionBefore } from './terms-standing';
import { compareClauses, termsWords } from './terms-words';

/** A party reads a version of terms beside the version before it, with who stands where. */
export const showTermsUseCase = workspaceUseCase(showTerms, async (world, { params }) => {
  const { tx, sees, actor, today } = world;
  const found = await findTerms(tx, sees, params.terms);
  if (!found || found.projectId !== params.project) throw notFound('version of terms');
  const { versions, nameOf } = await loadTermsStandings(world, params.project);
  const shown = versions.find(({ record }) => record.id === found.id);
  if (!shown) throw notFound('version of terms');
  const before = versionBefore(versions, found.number);
  const inForce = await findTermsInForce(tx, params.project, today);
  const mine = shown.standings.find(({ partyId }) => partyId === actor.partyId);
  const isOpen = found.status === 'proposed';
  return {
    ...presentTerms(shown, inForce?.id ?? null),
    project: { id: found.projectId, name: found.projectName },
    version: found.version,
    comparedWith: before ? { id: before.id, number: before.number } : null,
    clauses: compareClauses(
      termsWords(found.content, nameOf),
      before ? termsWords(before.content, nameOf) : null,
    ),
    standings: presentStandings(shown.standings, reachOf(actor.role, 'comment.write') !== 'no'),
    me: {
      partyId: actor.partyId,
      mayDecide: isOpen && mine !== undefined && reachOf(actor.role, 'terms.decide') !== 'no',
      state: mine?.state ?? null,
    },
    mayPropose: reachOf(actor.role, 'terms.propose') !== 'no',
  };
});
