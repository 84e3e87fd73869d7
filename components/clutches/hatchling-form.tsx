'use client';

import { useEffect, useRef, useState, type FormEvent, type KeyboardEvent } from 'react';
import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { DateInput } from '@/components/ui/date-input';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { useLogHatchlings } from '@/lib/client/clutches';
import { useWorkspace } from '@/lib/client/workspace';
import type { ClutchDetail } from '@/lib/contracts/clutch';
import { sex, type Sex } from '@/lib/contracts/animal';

interface Row {
  code: string;
  sex: Sex;
  grams: string;
  look: string;
  alive: boolean;
  note: string;
}
const sexes = [
  { value: 'unknown', label: 'Not sexed' },
  { value: 'male', label: 'Male' },
  { value: 'female', label: 'Female' },
];

/** One row per young; Enter goes down a column and proposes a new row at the end. On phones a row is a card. */
export function HatchlingForm({ clutch }: { clutch: ClutchDetail }) {
  const { slug, today } = useWorkspace();
  const log = useLogHatchlings();
  const most = Math.max(1, clutch.eggs - clutch.hatchlings);
  const [hatchedOn, setHatchedOn] = useState(clutch.hatchedOn ?? today);
  const propose = (taken: readonly Row[]): Row => ({
    code: clutch.proposedCodes.find((code) => !taken.some((row) => row.code === code)) ?? '',
    sex: 'unknown',
    grams: '',
    look: '',
    alive: true,
    note: '',
  });
  const [rows, setRows] = useState<Row[]>(() => [propose([])]);
  const [typed, setTyped] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const goTo = useRef<string | null>(null);
  useEffect(() => {
    if (!goTo.current) return;
    form.current?.querySelector<HTMLElement>(`[data-cell="${goTo.current}"]`)?.focus();
    goTo.current = null;
  }, [rows.length]);
  useEffect(() => {
    if (!typed) return undefined;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [typed]);

  const change = (index: number, part: Partial<Row>) => {
    setTyped(true);
    setRows((before) => before.map((row, at) => (at === index ? { ...row, ...part } : row)));
  };
  const add = () => setRows((before) => (before.length < most ? [...before, propose(before)] : before));
  const leaveOut = (index: number) => {
    // Errors name rows by their place, which changes now.
    log.reset();
    setRows((before) => before.filter((_, other) => other !== index));
  };
  const goDown = (event: KeyboardEvent<HTMLElement>, index: number, column: string) => {
    if (event.key !== 'Enter') return;
    event.preventDefault();
    const cell = `${column}-${index + 1}`;
    if (index + 1 < rows.length) form.current?.querySelector<HTMLElement>(`[data-cell="${cell}"]`)?.focus();
    else if (rows.length < most) {
      goTo.current = cell;
      add();
    }
  };
  const cell = (index: number, column: string) => ({
    'data-cell': `${column}-${index}`,
    onKeyDown: (event: KeyboardEvent<HTMLElement>) => goDown(event, index, column),
  });
  const save = (event: FormEvent) => {
    event.preventDefault();
    if (log.isPending) return;
    const hatchlings = rows.map(({ look, grams, ...row }) => ({
      ...row,
      grams: grams.trim() === '' ? null : Number(grams),
      shows: clutch.possibleLooks.find(({ key }) => key === look)?.shows ?? {},
    }));
    log.mutate(
      { params: { workspace: slug, clutch: clutch.id }, body: { hatchedOn, hatchlings } },
      {
        onSuccess: ({ ids }) => {
          setTyped(false);
          toast.success(`${ids.length} young logged`);
        },
      },
    );
  };
  const wrong = (field: string) => log.error?.messageFor(field);

  return (
    <form ref={form} onSubmit={save} className="flex flex-col gap-3">
      {log.error ? <FormErrorSummary message={log.error.problem.detail} /> : null}
      <Field label="Hatched on" error={wrong('hatchedOn')} className="max-w-48">
        <DateInput
          value={hatchedOn}
          min={clutch.laidOn}
          max={today}
          onChange={({ target }) => setHatchedOn(target.value)}
        />
      </Field>
      <ol className="flex flex-col gap-3">
        {rows.map((row, index) => {
          const at = `hatchlings.${index}`;
          return (
            <li
              key={index}
              className="grid grid-cols-2 items-end gap-2 border-b border-rule-2 pb-3 lg:grid-cols-[10rem_8rem_7rem_minmax(0,1fr)_7rem_minmax(0,1fr)_auto]"
            >
              <Field label={`Code of young ${index + 1}`} error={wrong(`${at}.code`)}>
                <TextInput
                  mono
                  value={row.code}
                  onChange={({ target }) => change(index, { code: target.value })}
                  {...cell(index, 'code')}
                />
              </Field>
              <Field label="Sex">
                <Select
                  value={row.sex}
                  options={sexes}
                  onChange={({ target }) => change(index, { sex: sex.parse(target.value) })}
                  {...cell(index, 'sex')}
                />
              </Field>
              <Field label="Weight" error={wrong(`${at}.grams`)}>
                <TextInput
                  mono
                  inputMode="numeric"
                  suffix="g"
                  value={row.grams}
                  onChange={({ target }) => change(index, { grams: target.value })}
                  {...cell(index, 'grams')}
                />
              </Field>
              <Field label="Looks" error={wrong(`${at}.shows`)}>
                <Select
                  value={row.look}
                  placeholder="Not judged yet"
                  options={clutch.possibleLooks.map(({ key, label, odds }) => ({
                    value: key,
                    label: `${label} (${odds})`,
                  }))}
                  onChange={({ target }) => change(index, { look: target.value })}
                  {...cell(index, 'look')}
                />
              </Field>
              <Field label="State">
                <Select
                  value={row.alive ? 'alive' : 'died'}
                  options={[
                    { value: 'alive', label: 'Alive' },
                    { value: 'died', label: 'Died' },
                  ]}
                  onChange={({ target }) => change(index, { alive: target.value === 'alive' })}
                  {...cell(index, 'alive')}
                />
              </Field>
              <Field label="Note" optional>
                <TextInput
                  value={row.note}
                  onChange={({ target }) => change(index, { note: target.value })}
                  {...cell(index, 'note')}
                />
              </Field>
              <Button
                tone="link"
                disabled={rows.length === 1}
                aria-label={`Leave out young ${index + 1}`}
                onClick={() => leaveOut(index)}
              >
                Leave out
              </Button>
            </li>
          );
        })}
      </ol>
      {wrong('hatchlings') ? <p className="text-sm text-alarm">{wrong('hatchlings')}</p> : null}
      <div className="flex flex-wrap gap-2">
        <Button onClick={add} disabled={rows.length >= most}>
          Add another
        </Button>
        <Button type="submit" tone="primary" busy={log.isPending}>
          Log {rows.length} {rows.length === 1 ? 'hatchling' : 'hatchlings'}
        </Button>
      </div>
    </form>
  );
}
