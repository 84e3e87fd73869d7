'use client';

import { Button } from '@/components/ui/button';
import { Select } from '@/components/ui/select';
import { useWorkspace } from '@/lib/client/workspace';
import { saySeason } from './odds-words';
import { isFiltered, type SeasonState } from './season-params';

const states = [
  { value: 'mine', label: 'Waiting for me' },
  { value: 'waiting', label: 'Waiting for answers' },
  { value: 'change_asked', label: 'Change asked for' },
  { value: 'agreed', label: 'Agreed' },
  { value: 'withdrawn', label: 'Withdrawn' },
];

/** Which season, project, partner and state; all of it in the address. */
export function SeasonFilters({
  state,
  season,
  seasons,
  onChange,
}: {
  state: SeasonState;
  season: number;
  seasons: readonly number[];
  onChange: (change: Partial<SeasonState>) => void;
}) {
  const { projects, parties } = useWorkspace();
  return (
    <div className="flex flex-wrap gap-2">
      <Select
        aria-label="Season"
        className="w-auto"
        value={String(season)}
        onChange={(event) => onChange({ season: Number(event.target.value), pairing: null })}
        options={seasons.map((year) => ({ value: String(year), label: saySeason(year) }))}
      />
      <Select
        aria-label="Project"
        className="w-auto"
        placeholder="All projects"
        value={state.project ?? ''}
        onChange={(event) => onChange({ project: event.target.value || null })}
        options={projects.map(({ id, name }) => ({ value: id, label: name }))}
      />
      <Select
        aria-label="Partner"
        className="w-auto"
        placeholder="All partners"
        value={state.party ?? ''}
        onChange={(event) => onChange({ party: event.target.value || null })}
        options={parties.map(({ id, name }) => ({ value: id, label: name }))}
      />
      <Select
        aria-label="State"
        className="w-auto"
        placeholder="Any state"
        value={state.state ?? ''}
        onChange={(event) =>
          onChange({
            state: states.some(({ value }) => value === event.target.value)
              ? (event.target.value as SeasonState['state'])
              : null,
          })
        }
        options={states}
      />
      {isFiltered(state) ? (
        <Button tone="plain" onClick={() => onChange({ project: null, party: null, state: null })}>
          Clear filters
        </Button>
      ) : null}
    </div>
  );
}
