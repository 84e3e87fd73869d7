import Fraction from 'fraction.js';

/**
 * Expected proceeds of a clutch in minor units: the price of each look times its exact odds, times eggs, hatch rate and
 * the share of eggs that does not die of its genotype; rounded once, half up, at the end. Looks without a price count
 * as nothing.
 * @param odds exact chance of each look among the young that live, such as "5/12"
 * @param hatchRate such as "81/100"
 */
export function expectProceeds(
  outcomes: readonly { odds: string; price: number | null }[],
  clutch: { eggs: number; hatchRate: string; lethal: string },
): { proceeds: number; hatchlings: number } {
  const hatchlings = new Fraction(clutch.eggs)
    .mul(new Fraction(clutch.hatchRate))
    .mul(new Fraction(1).sub(new Fraction(clutch.lethal)));
  const each = outcomes.reduce(
    (sum, { odds, price }) => (price === null ? sum : sum.add(new Fraction(odds).mul(price))),
    new Fraction(0),
  );
  return { proceeds: Number(each.mul(hatchlings).round(0).valueOf()), hatchlings: hatchlings.valueOf() };
}
