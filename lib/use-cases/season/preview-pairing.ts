import 'server-only';
import { previewPairing } from '@/lib/contracts/pairing';
import { workspaceUseCase } from '../world';
import { choosePair, findObstacles, seasonOf, usualDays } from './choose-pair';
import { makeFigures } from './make-figures';
import { seesWorth } from './present-pairings';
import { seeFigures } from './see-figures';

/** A member looks what a pairing could give before anything is proposed. Nothing is written. */
export const previewPairingUseCase = workspaceUseCase(previewPairing, async (world, { body }) => {
  const pair = await choosePair(world, body);
  const days = usualDays(world.today, pair.species.profile, body);
  const made = await makeFigures(world, {
    ...pair,
    startsOn: days.startsOn,
    eggsExpected: body.eggsExpected ?? null,
    prices: body.prices ?? null,
  });
  const season = seasonOf(days, pair.species.profile);
  const worth = seesWorth(world);
  return {
    figures: seeFigures(made.figures, worth),
    plan: {
      ...days,
      eggsExpected: made.figures.eggsExpected,
      note: '',
      acknowledgedCautions: [],
      ...(worth ? { prices: made.prices } : {}),
    },
    season,
    obstacles: await findObstacles(world, pair, { season, hasTerms: made.figures.termsId !== null }),
    ...(worth ? { medians: made.medians } : {}),
  };
});
