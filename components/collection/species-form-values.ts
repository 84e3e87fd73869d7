import type { SpeciesProfile } from '@/lib/contracts/species';
import type { SpeciesDetail } from '@/lib/contracts/species-catalogue';

export const speciesFigures = [
  { name: 'clutchFrom', label: 'Clutch from', unit: 'eggs' },
  { name: 'clutchUsual', label: 'Clutch usual', unit: 'eggs' },
  { name: 'clutchTo', label: 'Clutch to', unit: 'eggs' },
  { name: 'hatchPercent', label: 'Eggs that hatch', unit: '%' },
  { name: 'incubationFrom', label: 'Incubation from', unit: 'd' },
  { name: 'incubationUsual', label: 'Incubation usual', unit: 'd' },
  { name: 'incubationTo', label: 'Incubation to', unit: 'd' },
  { name: 'celsiusFrom', label: 'Incubated from', unit: '°C' },
  { name: 'celsiusTo', label: 'Incubated to', unit: '°C' },
  { name: 'ovulationUsual', label: 'Pairing to ovulation', unit: 'd' },
  { name: 'shedUsual', label: 'Ovulation to shed', unit: 'd' },
  { name: 'layingUsual', label: 'Shed to laying', unit: 'd' },
  { name: 'femaleGrams', label: 'Females from', unit: 'g' },
  { name: 'maleGrams', label: 'Males from', unit: 'g' },
  { name: 'femaleMonths', label: 'Females from', unit: 'mo' },
  { name: 'maleMonths', label: 'Males from', unit: 'mo' },
] as const;
export type FigureName = (typeof speciesFigures)[number]['name'];

type Values = {
  name: string;
  scientificName: string;
  codePrefix: string;
  sexSystem: SpeciesDetail['sexSystem'];
  source: string;
} & Record<FigureName, string>;

/** Percent of a fraction in text, to at most one decimal. */
function percentOf(fraction: string): string {
  const [top = 0, bottom = 1] = fraction.split('/').map(Number);
  return String(Math.round((top / bottom) * 1000) / 10);
}

export function valuesOfSpecies(species: SpeciesDetail | null): Values {
  const blank = Object.fromEntries(speciesFigures.map(({ name }) => [name, ''])) as Record<
    FigureName,
    string
  >;
  if (!species)
    return { name: '', scientificName: '', codePrefix: '', sexSystem: 'unknown', source: '', ...blank };
  const { profile } = species;
  const figures: Record<FigureName, number | string> = {
    clutchFrom: profile.clutchSize.from,
    clutchUsual: profile.clutchSize.usual,
    clutchTo: profile.clutchSize.to,
    hatchPercent: percentOf(profile.hatchRate.fraction),
    incubationFrom: profile.intervals.incubation.from,
    incubationUsual: profile.intervals.incubation.usual,
    incubationTo: profile.intervals.incubation.to,
    celsiusFrom: profile.incubationCelsius.from,
    celsiusTo: profile.incubationCelsius.to,
    ovulationUsual: profile.intervals.pairingToOvulation.usual,
    shedUsual: profile.intervals.ovulationToPreLayShed.usual,
    layingUsual: profile.intervals.preLayShedToLaying.usual,
    femaleGrams: profile.breeding.femaleGrams,
    maleGrams: profile.breeding.maleGrams,
    femaleMonths: profile.breeding.femaleMonths,
    maleMonths: profile.breeding.maleMonths,
  };
  return {
    name: species.name,
    scientificName: species.scientificName,
    codePrefix: species.codePrefix,
    sexSystem: species.sexSystem,
    source: profile.clutchSize.source,
    ...(Object.fromEntries(Object.entries(figures).map(([name, value]) => [name, String(value)])) as Record<
      FigureName,
      string
    >),
  };
}

/** The profile with the figures as typed; spans that the form does not show keep what they have. */
export function profileOf(values: Values, before: SpeciesProfile | null): SpeciesProfile {
  const number = (name: FigureName) => (values[name].trim() === '' ? Number.NaN : Number(values[name]));
  const changed = before ? valuesOfSpecies({ profile: before } as SpeciesDetail) : null;
  // A source stands with figures that were not touched; what is typed anew has the source that is typed.
  const source = (names: readonly FigureName[], was: string | undefined) =>
    changed &&
    was !== undefined &&
    names.every((name) => changed[name] === values[name]) &&
    values.source === changed.source
      ? was
      : values.source;
  const span = (name: FigureName, was: SpeciesProfile['intervals']['incubation'] | undefined) => {
    const usual = number(name);
    if (was && was.usual === usual) return was;
    return { from: Math.round(usual * 0.7), usual, to: Math.round(usual * 1.4), source: values.source };
  };
  return {
    bearing: before?.bearing ?? 'eggs',
    clutchSize: {
      from: number('clutchFrom'),
      usual: number('clutchUsual'),
      to: number('clutchTo'),
      source: source(['clutchFrom', 'clutchUsual', 'clutchTo'], before?.clutchSize.source),
    },
    hatchRate:
      before && percentOf(before.hatchRate.fraction) === values.hatchPercent
        ? before.hatchRate
        : { fraction: `${Math.round(number('hatchPercent') * 10)}/1000`, source: values.source },
    intervals: {
      pairingToOvulation: span('ovulationUsual', before?.intervals.pairingToOvulation),
      ovulationToPreLayShed: span('shedUsual', before?.intervals.ovulationToPreLayShed),
      preLayShedToLaying: span('layingUsual', before?.intervals.preLayShedToLaying),
      incubation: {
        from: number('incubationFrom'),
        usual: number('incubationUsual'),
        to: number('incubationTo'),
        source: source(
          ['incubationFrom', 'incubationUsual', 'incubationTo'],
          before?.intervals.incubation.source,
        ),
      },
      hatchToFirstShed: before?.intervals.hatchToFirstShed ?? {
        from: 7,
        usual: 10,
        to: 21,
        source: 'common practice',
      },
    },
    incubationCelsius: {
      from: number('celsiusFrom'),
      to: number('celsiusTo'),
      source: source(['celsiusFrom', 'celsiusTo'], before?.incubationCelsius.source),
    },
    breeding: {
      femaleGrams: number('femaleGrams'),
      maleGrams: number('maleGrams'),
      femaleMonths: number('femaleMonths'),
      maleMonths: number('maleMonths'),
      source: source(['femaleGrams', 'maleGrams', 'femaleMonths', 'maleMonths'], before?.breeding.source),
    },
  };
}
