import { importFields, type ImportField } from '@/lib/contracts/animal-import';

/** Heads that people write for a column, besides its own name. */
const otherHeads: Record<ImportField, readonly string[]> = {
  code: ['id', 'animal id', 'tag', 'identifier', 'animal'],
  name: ['nickname', 'pet name'],
  species: ['type', 'scientific name'],
  sex: ['gender', 'm/f'],
  'sexed by': ['sexing'],
  hatched: ['hatch date', 'hatched on', 'born', 'birth', 'birth date', 'dob', 'date of birth', 'hatch year'],
  origin: ['source', 'cb/wc'],
  status: ['state'],
  'status since': [],
  'held back': ['holdback'],
  sire: ['father', 'sire id', 'male parent', 'dad'],
  dam: ['mother', 'dam id', 'female parent', 'mom'],
  'possible sires': ['sires', 'possible fathers'],
  loci: ['genes', 'genetics', 'genotype', 'carries', 'traits'],
  owners: ['owner', 'owned by', 'parts'],
  'owned from': ['owned since', 'acquired', 'purchase date', 'bought'],
  place: ['tub', 'enclosure', 'location', 'cage', 'rack'],
  weights: ['weight', 'weight g', 'grams', 'weight (g)'],
  projects: ['project'],
  notes: ['note', 'comment', 'comments', 'remarks'],
};

/** Guesses what each column of a file is by its head; no meaning is given twice. */
export function guessColumns(head: readonly string[]): (ImportField | null)[] {
  const taken = new Set<ImportField>();
  return head.map((text) => {
    const plain = text
      .toLowerCase()
      .replace(/[_\s]+/g, ' ')
      .trim();
    const field = importFields.find(
      (name) => !taken.has(name) && (name === plain || otherHeads[name].includes(plain)),
    );
    if (!field) return null;
    taken.add(field);
    return field;
  });
}
