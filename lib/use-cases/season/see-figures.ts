import type { PairingFigures, PairingPlan } from '@/lib/contracts/pairing-figures';
import type { SeenFigures } from '@/lib/contracts/pairing';

type Figures = Omit<PairingFigures, 'termsId' | 'termsNumber'> & Pick<SeenFigures, 'termsId' | 'termsNumber'>;

/** The figures as they are shown: without any money to who may not see what a pairing is worth. */
export function seeFigures(figures: Figures, seesWorth: boolean): SeenFigures {
  if (seesWorth) return figures;
  const { proceeds: _proceeds, outcomes, ...rest } = figures;
  return { ...rest, outcomes: outcomes.map(({ price: _price, ...outcome }) => outcome) };
}

export function seePlan(
  plan: PairingPlan,
  seesWorth: boolean,
): Omit<PairingPlan, 'prices'> & Partial<Pick<PairingPlan, 'prices'>> {
  if (seesWorth) return plan;
  const { prices: _prices, ...rest } = plan;
  return rest;
}
