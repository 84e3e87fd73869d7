'use client';

import { MoneySplit } from '@/components/drawings/money-split';
import { useParties, useWorkspace } from '@/lib/client/workspace';
import type { TermsPreview } from '@/lib/contracts/terms';
import { formatMoney } from '@/lib/money/minor-units';

/** How an example sale would be cut by the terms, step by step. */
export function ExampleSplit({ preview }: { preview: TermsPreview }) {
  const { currency } = useWorkspace();
  const parties = useParties();
  const steps = preview.steps.map((step) => ({
    label: step.label,
    amount: step.amount,
    cuts: step.cuts.map(({ label, amount, partyId, note }) => {
      const mark = partyId ? parties.get(partyId)?.mark : undefined;
      return {
        label,
        amount,
        note,
        ...(mark === undefined
          ? { tone: 'slate' as const }
          : label === 'House share'
            ? { tone: 'straw' as const }
            : { partner: mark }),
      };
    }),
  }));
  return (
    <div className="flex flex-col gap-2">
      <p className="text-sm text-ink-3">{preview.example}.</p>
      <MoneySplit
        steps={steps}
        format={(amount) => formatMoney(amount, currency)}
        label="How the example sale would be split"
      />
    </div>
  );
}
