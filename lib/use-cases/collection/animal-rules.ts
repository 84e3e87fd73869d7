import type { Sex } from '@/lib/contracts/animal';
import type { HatchedPrecision } from '@/lib/contracts/animal-list';
import type { AnimalId, SpeciesId } from '@/lib/contracts/ids';
import type { FieldError } from '../refusal';

/** What the rules between relatives look at. */
export interface AnimalFacts {
  id: AnimalId;
  code: string;
  speciesId: SpeciesId;
  sex: Sex;
  hatchedOn: string | null;
  hatchedPrecision: HatchedPrecision;
}

export interface ParentChoice {
  sire: AnimalFacts | null;
  dam: AnimalFacts | null;
  possibleSires: readonly AnimalFacts[];
}

/** The last day that a date of this precision can mean. */
function latestDay(day: string, precision: HatchedPrecision): string {
  if (precision === 'day') return day;
  if (precision === 'year') return `${day.slice(0, 4)}-12-31`;
  const [year = 0, month = 1] = day.split('-').map(Number);
  return `${day.slice(0, 7)}-${String(new Date(Date.UTC(year, month, 0)).getUTCDate()).padStart(2, '0')}`;
}

function earliestDay(day: string, precision: HatchedPrecision): string {
  return precision === 'day'
    ? day
    : precision === 'month'
      ? `${day.slice(0, 7)}-01`
      : `${day.slice(0, 4)}-01-01`;
}

/** A date as it is known: "2022-07-03", "2022-07" or "2022". */
export function knownDate(day: string, precision: HatchedPrecision): string {
  return precision === 'day' ? day : precision === 'month' ? day.slice(0, 7) : day.slice(0, 4);
}

/** Whether the parent surely hatched on or after the day of its young; an estimate gets the benefit of the doubt. */
function isBornTooLate(parent: AnimalFacts, child: AnimalFacts): boolean {
  if (!parent.hatchedOn || !child.hatchedOn) return false;
  return (
    earliestDay(parent.hatchedOn, parent.hatchedPrecision) >=
    latestDay(child.hatchedOn, child.hatchedPrecision)
  );
}

function refuseParent(child: AnimalFacts, parent: AnimalFacts, as: 'sire' | 'dam'): string | null {
  if (parent.id === child.id) return `${child.code} can't be its own ${as}.`;
  if (parent.speciesId !== child.speciesId)
    return `${parent.code} is of another species; a ${as} is of the same one.`;
  if (as === 'sire' && parent.sex === 'female')
    return `${parent.code} is recorded as female; a sire is male.`;
  if (as === 'dam' && parent.sex === 'male') return `${parent.code} is recorded as male; a dam is female.`;
  if (isBornTooLate(parent, child) && parent.hatchedOn && child.hatchedOn) {
    const born = knownDate(parent.hatchedOn, parent.hatchedPrecision);
    const youngBorn = knownDate(child.hatchedOn, child.hatchedPrecision);
    return `${parent.code} hatched ${born}, not before ${child.code} (${youngBorn}): a parent is born before its young.`;
  }
  return null;
}

/** Each parent against the rules: species, sex, age, not itself. Fields as the forms and the file name them. */
export function checkParents(child: AnimalFacts, { sire, dam, possibleSires }: ParentChoice): FieldError[] {
  const errors: FieldError[] = [];
  const check = (field: string, parent: AnimalFacts | null, as: 'sire' | 'dam') => {
    const message = parent ? refuseParent(child, parent, as) : null;
    if (message) errors.push({ field, message });
  };
  check('sireId', sire, 'sire');
  check('damId', dam, 'dam');
  possibleSires.forEach((possible, index) => check(`possibleSires.${index}.animalId`, possible, 'sire'));
  if (sire && possibleSires.length > 0) {
    errors.push({
      field: 'possibleSires',
      message: `${sire.code} is given as the sire; leave him out to name possible ones.`,
    });
  }
  if (possibleSires.length === 1) {
    errors.push({
      field: 'possibleSires',
      message: 'Name at least two possible sires, or the one as the sire.',
    });
  }
  if (new Set(possibleSires.map(({ id }) => id)).size < possibleSires.length) {
    errors.push({ field: 'possibleSires', message: 'The same animal is named twice.' });
  }
  return errors;
}

/** An animal that is changed against its recorded young: it stays a possible parent of each. */
export function checkAsParent(
  parent: AnimalFacts,
  young: readonly { child: AnimalFacts; as: 'sire' | 'dam' }[],
): FieldError[] {
  const errors: FieldError[] = [];
  for (const { child, as } of young) {
    if (parent.speciesId !== child.speciesId) {
      errors.push({
        field: 'speciesId',
        message: `${child.code} is recorded as its young and is of the other species.`,
      });
    } else if (as === 'sire' ? parent.sex === 'female' : parent.sex === 'male') {
      errors.push({ field: 'sex', message: `It is recorded as the ${as} of ${child.code}.` });
    } else if (isBornTooLate(parent, child)) {
      errors.push({
        field: 'hatchedOn',
        message: `Its young ${child.code} hatched ${child.hatchedOn}: a parent is born before its young.`,
      });
    }
    if (errors.length) return errors;
  }
  return errors;
}
