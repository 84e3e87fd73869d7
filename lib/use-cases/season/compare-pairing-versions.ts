import type { VersionChange } from '@/lib/contracts/agreement';
import type { PairingFigures, PairingPlan } from '@/lib/contracts/pairing-figures';
import type { TermsContent } from '@/lib/contracts/terms-content';
import { formatMoney } from '@/lib/money/minor-units';
import { compareClauses, termsWords } from '../projects/terms-words';

interface ComparedVersion {
  plan: PairingPlan;
  figures: PairingFigures;
  terms: TermsContent | undefined;
}

/** What differs between two versions of a pairing, as the parties look at it. Money only for who may see it. */
export function comparePairingVersions(
  before: ComparedVersion,
  now: ComparedVersion,
  seesWorth: boolean,
): VersionChange[] {
  const changes: VersionChange[] = [];
  const note = (what: string, one: string, other: string) => {
    if (one !== other) changes.push({ what, before: one, after: other });
  };
  note('Together from', before.plan.startsOn, now.plan.startsOn);
  note('Together until', before.plan.endsOn, now.plan.endsOn);
  note('Eggs expected', String(before.figures.eggsExpected), String(now.figures.eggsExpected));
  note('Inbreeding of the young', percent(before.figures.inbreeding), percent(now.figures.inbreeding));
  const [odds, newOdds] = [before, now].map(({ figures }) =>
    figures.outcomes.map(({ key, odds: chance }) => `${key} ${chance}`).join(),
  );
  if (odds !== newOdds)
    changes.push({
      what: 'What can hatch',
      before: `${before.figures.outcomes.length} looks`,
      after: `${now.figures.outcomes.length} looks, other odds`,
    });
  if (seesWorth) {
    note('Terms', `version ${before.figures.termsNumber}`, `version ${now.figures.termsNumber}`);
    if (before.terms && now.terms && before.figures.termsId !== now.figures.termsId) {
      const nameOf = nameIn([before.figures, now.figures]);
      for (const clause of compareClauses(termsWords(now.terms, nameOf), termsWords(before.terms, nameOf))) {
        if (clause.changed) note(clause.title, clause.before ?? '', clause.text);
      }
    }
    for (const { key, looksLike, price } of now.figures.outcomes) {
      const earlier = before.figures.outcomes.find((row) => row.key === key)?.price ?? null;
      const money = (amount: number | null) =>
        amount === null ? 'no price' : formatMoney(amount, now.figures.proceeds.currency);
      note(`Price of ${looksLike}`, money(earlier), money(price));
    }
    const { currency } = now.figures.proceeds;
    note(
      'Expected proceeds',
      formatMoney(before.figures.proceeds.expected, currency),
      formatMoney(now.figures.proceeds.expected, currency),
    );
  }
  note('Note', before.plan.note, now.plan.note);
  return changes;
}

const percent = (share: number) => `${(share * 100).toFixed(1).replace(/\.0$/, '')}%`;

const nameIn = (figures: readonly PairingFigures[]) => (id: string) =>
  figures.flatMap(({ proceeds }) => proceeds.shares).find(({ partyId }) => partyId === id)?.name ??
  'another party';
