import { z } from 'zod';
import { contract } from './contract';

/** What a column of the file can mean, in the order of the export. */
export const importFields = [
  'code',
  'name',
  'species',
  'sex',
  'sexed by',
  'hatched',
  'origin',
  'status',
  'status since',
  'held back',
  'sire',
  'dam',
  'possible sires',
  'loci',
  'owners',
  'owned from',
  'place',
  'weights',
  'projects',
  'notes',
] as const;
export const importField = z.enum(importFields);
export type ImportField = z.infer<typeof importField>;

const csvText = z.string().min(1, 'The file is empty.').max(5_000_000, 'The file is larger than 5 MB.');

const importBody = z.object({
  csv: csvText,
  /** Meaning of each column in the file's order; null leaves a column out. Guessed from the head when not given. */
  columns: z.array(importField.nullable()).max(200).optional(),
});

export const importRow = z.object({
  /** Row of the file, the head being 1. */
  line: z.int(),
  code: z.string(),
  summary: z.string(),
  errors: z.array(z.object({ field: z.string(), message: z.string() })),
});

export const previewImport = contract({
  id: 'animals.import.preview',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/import/preview',
  summary: 'Read a CSV file of animals and say what each row would become, saving nothing',
  access: { scope: 'workspace', action: 'animal.import' },
  body: importBody,
  response: z.object({
    head: z.array(z.string()),
    columns: z.array(importField.nullable()),
    /** First values of each column, to choose by. */
    samples: z.array(z.array(z.string())),
    rows: z.array(importRow),
    errors: z.int(),
  }),
});
export type ImportPreview = z.infer<typeof previewImport.response>;

export const importAnimals = contract({
  id: 'animals.import',
  method: 'POST',
  path: '/workspaces/{workspace}/animals/import',
  summary: 'Import a CSV file of animals: every row, or none',
  access: { scope: 'workspace', action: 'animal.import' },
  body: importBody,
  response: z.object({ imported: z.int() }),
  idempotent: true,
});
