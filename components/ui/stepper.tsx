import { Check } from 'lucide-react';
import { classNames } from './class-names';

export type Step = { id: string; label: string };

/** Where a person stands in a task of several screens. On a phone only the current step is named. */
export function Stepper({
  steps,
  current,
  label,
}: {
  steps: readonly Step[];
  current: string;
  label: string;
}) {
  const at = Math.max(
    0,
    steps.findIndex((step) => step.id === current),
  );
  return (
    <nav aria-label={label}>
      <p className="text-sm text-ink-3 sm:hidden">
        Step {at + 1} of {steps.length}: <span className="font-semibold text-ink">{steps[at]?.label}</span>
      </p>
      <ol className="flex items-center gap-2 max-sm:mt-2">
        {steps.map((step, index) => (
          <li
            key={step.id}
            aria-current={index === at ? 'step' : undefined}
            className={classNames(
              'flex items-center gap-2 text-sm max-sm:flex-1',
              index <= at ? 'text-ink' : 'text-ink-3',
            )}
          >
            <span
              className={classNames(
                'grid size-6 shrink-0 place-items-center rounded-full font-mono max-sm:hidden',
                index < at && 'bg-moss text-on-moss',
                index === at && 'bg-ink font-semibold text-paper',
                index > at && 'border border-edge',
              )}
            >
              {index < at ? <Check aria-label="done" className="size-3.5" /> : index + 1}
            </span>
            <span className={classNames('max-sm:sr-only', index === at && 'font-semibold')}>
              {step.label}
            </span>
            <span
              aria-hidden
              className={classNames('h-1 w-full rounded-full sm:hidden', index <= at ? 'bg-ink' : 'bg-track')}
            />
            {index < steps.length - 1 ? (
              <span aria-hidden className="h-px w-6 bg-edge max-sm:hidden" />
            ) : null}
          </li>
        ))}
      </ol>
    </nav>
  );
}
