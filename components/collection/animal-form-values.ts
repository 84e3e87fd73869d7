import type { z } from 'zod';
import type { AnimalOrigin, AnimalStatus, LocusClaim, Sex } from '@/lib/contracts/animal';
import type { HatchedPrecision } from '@/lib/contracts/animal-list';
import type { AnimalRecord, createAnimal, editAnimal, Relative } from '@/lib/contracts/animal-record';
import type { PartLine } from './parts-fields';
import { partsOf } from './parts-fields';

/** A chosen relative, or one that stays as it is because it is not shown to the person. */
export type ParentChoice = { id: string; label: string } | 'hidden' | null;

export interface LocusLine {
  locusId: string;
  shows: string | null;
  carries: LocusClaim['carries'];
}

export interface AnimalFormValues {
  code: string;
  name: string;
  speciesId: string;
  sex: Sex;
  sexedBy: string;
  hatchedPrecision: HatchedPrecision;
  hatchedOn: string;
  origin: AnimalOrigin;
  status: AnimalStatus;
  statusSince: string;
  heldBack: boolean;
  notes: string;
  sire: ParentChoice;
  dam: ParentChoice;
  possibleSires: { choice: ParentChoice; weight: string }[];
  tubId: string;
  loci: LocusLine[];
  owners: PartLine[];
  ownedFrom: string;
  projectId: string;
}

const choiceOf = (relative: Relative | null): ParentChoice =>
  relative === null ? null : relative.shown ? { id: relative.id, label: relative.code } : 'hidden';

export function emptyValues(partyId: string | null, speciesId: string): AnimalFormValues {
  return {
    code: '',
    name: '',
    speciesId,
    sex: 'unknown',
    sexedBy: '',
    hatchedPrecision: 'day',
    hatchedOn: '',
    origin: 'captive_bred',
    status: 'here',
    statusSince: '',
    heldBack: false,
    notes: '',
    sire: null,
    dam: null,
    possibleSires: [],
    tubId: '',
    loci: [],
    owners: [{ partyId: partyId ?? '', parts: '1' }],
    ownedFrom: '',
    projectId: '',
  };
}

export function valuesOf(animal: AnimalRecord): AnimalFormValues {
  const cut = { day: 10, month: 7, year: 4 }[animal.hatchedPrecision];
  return {
    ...emptyValues(null, animal.species.id),
    code: animal.code,
    name: animal.name,
    sex: animal.sex,
    sexedBy: animal.sexedBy ?? '',
    hatchedPrecision: animal.hatchedPrecision,
    hatchedOn: animal.hatchedOn?.slice(0, cut) ?? '',
    origin: animal.origin,
    status: animal.status,
    statusSince: animal.statusSince ?? '',
    heldBack: animal.heldBack,
    notes: animal.notes,
    sire: choiceOf(animal.sire),
    dam: choiceOf(animal.dam),
    possibleSires: animal.possibleSires.map(({ sire, weight }) => ({
      choice: choiceOf(sire),
      weight: String(weight),
    })),
    tubId: animal.tub?.id ?? '',
    loci: animal.loci.flatMap(({ locusId, claim }) => (claim ? [{ locusId, ...claim }] : [])),
  };
}

function hatchedDay({ hatchedOn, hatchedPrecision }: AnimalFormValues): string | null {
  if (!hatchedOn) return null;
  return hatchedPrecision === 'year'
    ? `${hatchedOn}-01-01`
    : hatchedPrecision === 'month'
      ? `${hatchedOn}-01`
      : hatchedOn;
}

/** What both forms send alike. Ids are checked by the contract. */
function commonBody(values: AnimalFormValues) {
  return {
    name: values.name,
    speciesId: values.speciesId,
    sex: values.sex,
    sexedBy: values.sexedBy || null,
    hatchedOn: hatchedDay(values),
    hatchedPrecision: values.hatchedPrecision,
    origin: values.origin,
    status: values.status,
    heldBack: values.heldBack,
    notes: values.notes,
    tubId: values.tubId || null,
    loci: values.loci.filter(({ locusId }) => locusId),
  };
}

const idOf = (choice: ParentChoice) => (choice && choice !== 'hidden' ? choice.id : null);
const siresOf = (values: AnimalFormValues) =>
  values.possibleSires.map(({ choice, weight }) => ({
    animalId: idOf(choice) ?? '',
    weight: /^\d+$/.test(weight) ? Number(weight) : 0,
  }));

export function createBody(values: AnimalFormValues): z.input<typeof createAnimal.body> {
  return {
    ...commonBody(values),
    code: values.code || undefined,
    statusSince: values.statusSince || null,
    sireId: idOf(values.sire),
    damId: idOf(values.dam),
    possibleSires: siresOf(values),
    owners: partsOf(values.owners),
    ownedFrom: values.ownedFrom || undefined,
    projectId: values.projectId || null,
  } as z.input<typeof createAnimal.body>;
}

/** Only what the person changed is sent, so that what they do not see stays as it is. */
export function editBody(
  values: AnimalFormValues,
  before: AnimalFormValues,
  version: number,
): z.input<typeof editAnimal.body> {
  const all = {
    ...commonBody(values),
    code: values.code,
    statusSince: values.statusSince || null,
    sireId: idOf(values.sire),
    damId: idOf(values.dam),
    possibleSires: siresOf(values),
  };
  const was: Record<string, unknown> = {
    ...commonBody(before),
    code: before.code,
    statusSince: before.statusSince || null,
    sireId: idOf(before.sire),
    damId: idOf(before.dam),
    possibleSires: siresOf(before),
  };
  const changed = Object.entries(all).filter(
    ([name, value]) => JSON.stringify(value) !== JSON.stringify(was[name]),
  );
  // A parent that is not shown counts as nothing above; taking it away is a change of its own.
  if (before.sire === 'hidden' && values.sire === null) changed.push(['sireId', null]);
  if (before.dam === 'hidden' && values.dam === null) changed.push(['damId', null]);
  return { ...Object.fromEntries(changed), version } as z.input<typeof editAnimal.body>;
}

/** What somebody else saved in the meantime, in the words of the form. */
export function changedFields(
  before: AnimalFormValues,
  now: AnimalFormValues,
): { label: string; before: string; now: string }[] {
  const say = (value: unknown): string => {
    if (value === null || value === '' || value === undefined) return 'nothing';
    if (value === true) return 'yes';
    if (value === false) return 'no';
    if (Array.isArray(value)) return value.length ? `${value.length} recorded` : 'nothing';
    if (typeof value === 'object') return 'label' in value ? String(value.label) : 'changed';
    return String(value).replaceAll('_', ' ');
  };
  const labels: Partial<Record<keyof AnimalFormValues, string>> = {
    code: 'Code',
    name: 'Name',
    speciesId: 'Species',
    sex: 'Sex',
    sexedBy: 'Sex known by',
    hatchedOn: 'Hatched',
    origin: 'Origin',
    status: 'Status',
    statusSince: 'Status since',
    heldBack: 'Held back',
    notes: 'Notes',
    sire: 'Sire',
    dam: 'Dam',
    possibleSires: 'Possible sires',
    tubId: 'Place',
    loci: 'Loci',
  };
  return (Object.keys(labels) as (keyof AnimalFormValues)[])
    .filter((name) => JSON.stringify(before[name]) !== JSON.stringify(now[name]))
    .map((name) => ({ label: labels[name] ?? name, before: say(before[name]), now: say(now[name]) }));
}
