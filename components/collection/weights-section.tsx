'use client';

import { Trash2 } from 'lucide-react';
import { useState, type FormEvent } from 'react';
import { toast } from 'sonner';
import { sayDay } from '@/components/drawings/season-days';
import { Button } from '@/components/ui/button';
import { DateInput } from '@/components/ui/date-input';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { IconButton } from '@/components/ui/icon-button';
import { TextInput } from '@/components/ui/text-input';
import { useAddWeight, useRemoveWeight } from '@/lib/client/collection';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { AnimalRecord } from '@/lib/contracts/animal-record';
import { sayGrams } from './words';

const FIRST = 4;

/** Weights over time, newest first, with a line and a small form. */
export function WeightsSection({ animal }: { animal: AnimalRecord }) {
  const { slug, today } = useWorkspace();
  const mayEdit = useMay('animal.edit');
  const add = useAddWeight();
  const remove = useRemoveWeight();
  const [adds, setAdds] = useState(false);
  const [all, setAll] = useState(false);
  const [day, setDay] = useState(today);
  const [grams, setGrams] = useState('');
  const shown = all ? animal.weights : animal.weights.slice(0, FIRST);

  const save = (event: FormEvent) => {
    event.preventDefault();
    if (add.isPending) return;
    add.mutate(
      {
        params: { workspace: slug, animal: animal.id },
        body: { weighedOn: day, grams: grams.trim() === '' ? 0 : Number(grams) },
      },
      {
        onSuccess: () => {
          setGrams('');
          setAdds(false);
          toast.success('Weight recorded');
        },
      },
    );
  };
  const wrong = (field: string) => add.error?.messageFor(field);

  return (
    <section>
      <div className="mb-1 flex items-baseline justify-between gap-3">
        <h3 className="text-lg">Weights</h3>
        {mayEdit && !adds ? (
          <Button size="sm" tone="link" onClick={() => setAdds(true)}>
            Record a weight
          </Button>
        ) : null}
      </div>
      {animal.weights.length > 1 ? <WeightLine weights={animal.weights} /> : null}
      {adds ? (
        <form onSubmit={save} className="mb-2 flex flex-col gap-2">
          {add.error && !wrong('weighedOn') && !wrong('grams') ? (
            <FormErrorSummary message={add.error.problem.detail} />
          ) : null}
          <div className="grid grid-cols-2 gap-2">
            <Field label="Weighed on" error={wrong('weighedOn')}>
              <DateInput value={day} max={today} onChange={(event) => setDay(event.target.value)} />
            </Field>
            <Field label="Weight" error={wrong('grams')}>
              <TextInput
                mono
                inputMode="numeric"
                suffix="g"
                value={grams}
                onChange={(event) => setGrams(event.target.value)}
                autoFocus
              />
            </Field>
          </div>
          <div className="flex gap-2">
            <Button type="submit" size="sm" tone="primary" busy={add.isPending}>
              Save
            </Button>
            <Button size="sm" onClick={() => setAdds(false)}>
              Cancel
            </Button>
          </div>
        </form>
      ) : null}
      {animal.weights.length === 0 ? <p className="text-base text-ink-3">None recorded.</p> : null}
      <ul>
        {shown.map((weight) => (
          <li
            key={weight.id}
            className="flex items-center justify-between gap-3 border-b border-rule-2 py-1 last:border-b-0"
          >
            <span className="text-ink-2">{sayDay(weight.weighedOn)}</span>
            <span className="flex items-center gap-1 font-mono">
              {sayGrams(weight.grams)}
              {mayEdit ? (
                <IconButton
                  label={`Take back ${sayGrams(weight.grams)} of ${sayDay(weight.weighedOn)}`}
                  className="size-7"
                  disabled={remove.isPending}
                  onClick={() =>
                    remove.mutate(
                      { params: { workspace: slug, animal: animal.id, weight: weight.id } },
                      { onError: (error) => toast.error(error.problem.detail) },
                    )
                  }
                >
                  <Trash2 aria-hidden className="!size-3.5" />
                </IconButton>
              ) : null}
            </span>
          </li>
        ))}
      </ul>
      {animal.weights.length > FIRST ? (
        <Button size="sm" tone="link" className="mt-1" onClick={() => setAll(!all)}>
          {all ? 'Only the newest' : `All ${animal.weights.length}`}
        </Button>
      ) : null}
    </section>
  );
}

/** The course of the weights; the list beside it says the same in figures. */
function WeightLine({ weights }: { weights: AnimalRecord['weights'] }) {
  const points = [...weights]
    .reverse()
    .map(({ weighedOn, grams }) => ({ day: Date.parse(weighedOn), grams }));
  const days = points.map(({ day }) => day);
  const most = Math.max(...points.map(({ grams }) => grams));
  const [first, last] = [Math.min(...days), Math.max(...days)];
  const place = ({ day, grams }: { day: number; grams: number }) =>
    `${(last === first ? 0.5 : (day - first) / (last - first)) * 100},${30 - (grams / most) * 27}`;
  return (
    <svg aria-hidden viewBox="-2 0 104 32" preserveAspectRatio="none" className="mb-1 h-12 w-full">
      <polyline
        points={points.map(place).join(' ')}
        fill="none"
        stroke="var(--slate)"
        strokeWidth="2"
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}
