import 'server-only';
import { previewImport } from '@/lib/contracts/animal-import';
import { workspaceUseCase } from '../world';
import { planImport, type PlannedAnimal } from './plan-import';

/** The owner looks at what a file would become before anything is saved. */
export const previewImportUseCase = workspaceUseCase(previewImport, async (world, { body }) => {
  const { head, columns, samples, rows } = await planImport(world, body);
  return {
    head,
    columns,
    samples,
    rows: rows.map(({ line, errors, animal }) => ({
      line,
      code: animal.code,
      summary: summarise(animal),
      errors,
    })),
    errors: rows.reduce((sum, row) => sum + row.errors.length, 0),
  };
});

function summarise(animal: PlannedAnimal): string {
  const parts = [
    animal.name,
    animal.sex,
    animal.hatchedOn?.slice(
      0,
      animal.hatchedPrecision === 'year' ? 4 : animal.hatchedPrecision === 'month' ? 7 : 10,
    ),
  ];
  const looks = animal.loci.map(({ shows }) => shows).filter(Boolean);
  const parents = animal.sireId || animal.damId || animal.possibleSires.length ? 'with parents' : '';
  return [...parts, looks.join(' '), parents].filter(Boolean).join(' · ');
}
