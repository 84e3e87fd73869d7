'use client';

import { Plus, X } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { IconButton } from '@/components/ui/icon-button';
import { Select } from '@/components/ui/select';
import { useSpecies } from '@/lib/client/species';
import type { Sex } from '@/lib/contracts/animal';
import type { LocusEntry } from '@/lib/contracts/locus';
import type { LocusLine } from './animal-form-values';

const bases = {
  stated: 'stated by somebody',
  tested: 'tested in a laboratory',
  proven: 'proven by its young',
} as const;

/** What an animal looks like and carries, one line per locus. Loci without a line count as normal. */
export function LociFields({
  lines,
  onChange,
  speciesId,
  sex,
  messageFor,
}: {
  lines: readonly LocusLine[];
  onChange: (lines: LocusLine[]) => void;
  speciesId: string;
  sex: Sex;
  messageFor: (field: string) => string | undefined;
}) {
  const loci = useSpecies(speciesId).data?.loci ?? [];
  const used = new Set(lines.map(({ locusId }) => locusId));
  const free = loci.filter(({ id }) => !used.has(id));
  const set = (index: number, change: Partial<LocusLine>) =>
    onChange(lines.map((line, at) => (at === index ? { ...line, ...change } : line)));
  return (
    <div className="flex flex-col gap-3">
      {lines.map((line, index) => (
        <LocusFields
          key={`${index}-${line.locusId}`}
          line={line}
          locus={loci.find(({ id }) => id === line.locusId) ?? null}
          choices={loci.filter(({ id }) => id === line.locusId || !used.has(id))}
          sex={sex}
          messages={['locusId', 'shows', 'carries']
            .map((part) => messageFor(`loci.${index}.${part}`))
            .filter((text) => text !== undefined)}
          onChange={(change) => set(index, change)}
          onRemove={() => onChange(lines.filter((_, at) => at !== index))}
        />
      ))}
      <div>
        <Button
          size="sm"
          icon={<Plus aria-hidden />}
          disabled={free.length === 0}
          onClick={() => onChange([...lines, { locusId: free[0]?.id ?? '', shows: null, carries: null }])}
        >
          Add a locus
        </Button>
        {loci.length === 0 && speciesId ? (
          <p className="mt-1 text-sm text-ink-3">
            This species has no loci yet; add them under “Species and loci”.
          </p>
        ) : null}
      </div>
    </div>
  );
}

function LocusFields({
  line,
  locus,
  choices,
  sex,
  messages,
  onChange,
  onRemove,
}: {
  line: LocusLine;
  locus: LocusEntry | null;
  choices: readonly LocusEntry[];
  sex: Sex;
  messages: string[];
  onChange: (change: Partial<LocusLine>) => void;
  onRemove: () => void;
}) {
  const name = locus?.name ?? 'locus';
  const genotypes = locus?.genotypes[sex] ?? [];
  const looks = [...new Set(genotypes.map(({ phenotype }) => phenotype))].filter(Boolean);
  const presets = locus ? carriesPresets(locus, sex) : [];
  const current = line.carries ? keyOf(line.carries.genotypes) : '';
  const isOther = current !== '' && !presets.some(({ key }) => key === current);
  return (
    <div className="flex flex-col gap-2 border-b border-rule-2 pb-3 last:border-b-0">
      <div className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-2 sm:grid-cols-[minmax(0,1.1fr)_minmax(0,1fr)_minmax(0,1.4fr)_auto]">
        <Select
          aria-label="Locus"
          value={line.locusId}
          onChange={(event) => onChange({ locusId: event.target.value, shows: null, carries: null })}
          options={choices.map(({ id, name: text }) => ({ value: id, label: text }))}
        />
        <IconButton label={`Remove ${name}`} onClick={onRemove} className="sm:order-last">
          <X aria-hidden />
        </IconButton>
        <Select
          aria-label={`${name}: looks`}
          value={line.shows === null ? 'unjudged' : `is ${line.shows}`}
          onChange={(event) =>
            onChange({ shows: event.target.value === 'unjudged' ? null : event.target.value.slice(3) })
          }
          options={[
            { value: 'unjudged', label: 'looks: not judged' },
            { value: 'is ', label: 'looks normal' },
            ...looks.map((look) => ({ value: `is ${look}`, label: `looks ${look}` })),
          ]}
        />
        <Select
          aria-label={`${name}: carries`}
          value={current}
          onChange={(event) => {
            const preset = presets.find(({ key }) => key === event.target.value);
            onChange({
              carries: preset
                ? { genotypes: preset.genotypes, basis: line.carries?.basis ?? 'stated' }
                : null,
            });
          }}
          options={[
            { value: '', label: 'carries: as it follows' },
            ...(isOther ? [{ value: current, label: `as recorded: ${current}` }] : []),
            ...presets.map(({ key, label }) => ({ value: key, label })),
          ]}
        />
      </div>
      {line.carries ? (
        <Select
          aria-label={`${name}: how sure`}
          className="sm:max-w-xs"
          value={line.carries.basis}
          onChange={(event) =>
            onChange({
              carries: line.carries
                ? { ...line.carries, basis: event.target.value as keyof typeof bases }
                : null,
            })
          }
          options={Object.entries(bases).map(([value, label]) => ({ value, label }))}
        />
      ) : null}
      {messages.map((message) => (
        <p key={message} className="text-sm font-medium text-alarm">
          {message}
        </p>
      ))}
    </div>
  );
}

const keyOf = (genotypes: Record<string, string>) =>
  Object.entries(genotypes)
    .map(([genotype, odds]) => `${genotype} ${odds}`)
    .sort()
    .join(', ');

/** Every certain genotype of the sex, and the usual chances of one copy that can't be seen. */
function carriesPresets(
  locus: LocusEntry,
  sex: Sex,
): { key: string; label: string; genotypes: Record<string, string> }[] {
  const genotypes = locus.genotypes[sex];
  const certain = genotypes.map(({ genotype, words }) => ({
    label: `${words} (${genotype})`,
    genotypes: { [genotype]: '1' },
  }));
  const none = genotypes.find(({ copies }) => copies === 0);
  const hidden = genotypes.filter(({ copies, phenotype }) => copies === 1 && phenotype === '');
  const chances = [
    ['2/3', '1/3', '66%'],
    ['1/2', '1/2', '50%'],
    ['1/3', '2/3', '33%'],
    ['1/4', '3/4', '25%'],
  ] as const;
  const possible = none
    ? hidden.flatMap(({ genotype, words }) =>
        chances.map(([yes, no, percent]) => ({
          label: `${percent} ${words}`,
          genotypes: { [genotype]: yes, [none.genotype]: no },
        })),
      )
    : [];
  return [...certain, ...possible].map((preset) => ({ ...preset, key: keyOf(preset.genotypes) }));
}
