'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { toast } from 'sonner';
import { sayDay } from '@/components/drawings/season-days';
import { Button } from '@/components/ui/button';
import { DateInput } from '@/components/ui/date-input';
import { Field } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import {
  useLayClutch,
  useLogPairingEvent,
  usePairingEvents,
  useRetractPairingEvent,
} from '@/lib/client/clutches';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { PairingId } from '@/lib/contracts/ids';
import { pairingEventKind, type PairingEventKind } from '@/lib/contracts/pairing-figures';

const words: Record<PairingEventKind, string> = {
  introduction: 'Introduced',
  separation: 'Separated',
  lock: 'Lock',
  refusal: 'Refused',
  follicles: 'Follicles',
  ovulation: 'Ovulation',
  pre_lay_shed: 'Pre-lay shed',
};

/** What was seen of an agreed pairing, with forms to log more and the laying. */
export function PairingLog({ pairing }: { pairing: PairingId }) {
  const { slug, today } = useWorkspace();
  const router = useRouter();
  const maySee = useMay('season.log');
  const mayLay = useMay('clutch.log');
  const events = usePairingEvents(pairing);
  const log = useLogPairingEvent();
  const lay = useLayClutch();
  const retract = useRetractPairingEvent();
  const [kind, setKind] = useState<PairingEventKind | 'laying'>('lock');
  const [day, setDay] = useState(today);
  const [eggs, setEggs] = useState('');
  const [slugs, setSlugs] = useState('0');
  const params = { workspace: slug, pairing };
  const isLaying = kind === 'laying';
  const error = isLaying ? lay.error : log.error;
  const save = () => {
    if (log.isPending || lay.isPending) return;
    if (isLaying) {
      lay.mutate(
        { params, body: { laidOn: day, eggs: Number(eggs), slugs: Number(slugs) } },
        { onSuccess: ({ id }) => router.push(`/${slug}/clutches/${id}`) },
      );
    } else {
      log.mutate({ params, body: { kind, seenOn: day } }, { onSuccess: () => toast.success('Logged') });
    }
  };
  const kinds = pairingEventKind.options.map((value) => ({ value: value as string, label: words[value] }));
  return (
    <Panel title="Log">
      {events.data?.events.length === 0 ? <p className="text-ink-3">Nothing was logged yet.</p> : null}
      {events.isError ? <p className="text-ink-3">{events.error.problem.detail}</p> : null}
      <ul>
        {events.data?.events.map((event) => (
          <li
            key={event.id}
            className="flex flex-wrap items-baseline justify-between gap-x-3 border-b border-rule-2 py-1"
          >
            <span className={event.retracted ? 'text-ink-3 line-through' : undefined}>
              {words[event.kind]}
              {event.minutes ? `, ${event.minutes} min` : ''} · {sayDay(event.seenOn)} · {event.by}
            </span>
            {maySee && !event.retracted ? (
              <Button
                size="sm"
                tone="link"
                disabled={retract.isPending}
                onClick={() =>
                  retract.mutate(
                    { params: { ...params, event: event.id } },
                    { onError: (failed) => toast.error(failed.problem.detail) },
                  )
                }
              >
                Take back
              </Button>
            ) : null}
          </li>
        ))}
      </ul>
      {maySee ? (
        <form
          className="mt-3 grid grid-cols-2 gap-2"
          onSubmit={(event) => {
            event.preventDefault();
            save();
          }}
        >
          {error ? (
            <div className="col-span-2">
              <FormErrorSummary message={error.problem.detail} />
            </div>
          ) : null}
          <Field label="What was seen">
            <Select
              value={kind}
              options={mayLay ? [...kinds, { value: 'laying', label: 'Laying' }] : kinds}
              onChange={({ target }) => setKind(pairingEventKind.safeParse(target.value).data ?? 'laying')}
            />
          </Field>
          <Field label="Day" error={error?.messageFor(isLaying ? 'laidOn' : 'seenOn')}>
            <DateInput value={day} max={today} onChange={({ target }) => setDay(target.value)} />
          </Field>
          {isLaying ? (
            <>
              <Field label="Eggs" error={error?.messageFor('eggs')}>
                <TextInput
                  mono
                  inputMode="numeric"
                  value={eggs}
                  onChange={({ target }) => setEggs(target.value)}
                />
              </Field>
              <Field label="Slugs" error={error?.messageFor('slugs')}>
                <TextInput
                  mono
                  inputMode="numeric"
                  value={slugs}
                  onChange={({ target }) => setSlugs(target.value)}
                />
              </Field>
            </>
          ) : null}
          <Button type="submit" tone="primary" className="col-span-2" busy={log.isPending || lay.isPending}>
            {isLaying ? 'Log laying' : 'Log it'}
          </Button>
        </form>
      ) : null}
    </Panel>
  );
}
