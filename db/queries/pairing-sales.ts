import 'server-only';
import { and, eq, inArray } from 'drizzle-orm';
import type { AnimalId, SpeciesId } from '@/lib/contracts/ids';
import type { Transaction } from '../scope';
import { animals } from '../schema/collection';
import { invoiceLines, invoices } from '../schema/sales';
import { visibleAnimal, type Visibility } from './visibility';

/** What animals of a species that are seen were sold for: lines of invoices on which something was paid. */
export async function listSalesOfSpecies(
  tx: Transaction,
  sees: Visibility,
  speciesId: SpeciesId,
): Promise<{ animalId: AnimalId; amount: number }[]> {
  return tx
    .select({ animalId: animals.id, amount: invoiceLines.amount })
    .from(invoiceLines)
    .innerJoin(
      invoices,
      and(eq(invoices.workspaceId, invoiceLines.workspaceId), eq(invoices.id, invoiceLines.invoiceId)),
    )
    .innerJoin(
      animals,
      and(eq(animals.workspaceId, invoiceLines.workspaceId), eq(animals.id, invoiceLines.animalId)),
    )
    .where(
      and(
        eq(animals.speciesId, speciesId),
        eq(invoiceLines.kind, 'animal'),
        inArray(invoices.status, ['part_paid', 'paid']),
        visibleAnimal(tx, sees),
      ),
    );
}
