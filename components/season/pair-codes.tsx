import { AnimalCode } from '@/components/collection/animal-code';

/** Sire and dam as on their labels. */
export function PairCodes({ sire, dam, size = 'sm' }: { sire: string; dam: string; size?: 'sm' | 'md' }) {
  return (
    <span className="inline-flex items-center gap-1">
      <AnimalCode code={sire} sex="male" size={size} />
      <span aria-hidden className="text-ink-3">
        ×
      </span>
      <span className="sr-only">with</span>
      <AnimalCode code={dam} sex="female" size={size} />
    </span>
  );
}
