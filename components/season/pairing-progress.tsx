'use client';

import Link from 'next/link';
import { sayDay } from '@/components/drawings/season-days';
import { Panel } from '@/components/ui/panel';
import { useWorkspace } from '@/lib/client/workspace';
import type { PairingDetail } from '@/lib/contracts/pairing';

const eventWords: Record<PairingDetail['events'][number]['kind'], string> = {
  introduction: 'Put together',
  separation: 'Parted',
  lock: 'Lock',
  refusal: 'Refused to pair',
  follicles: 'Follicle check',
  ovulation: 'Ovulation',
  pre_lay_shed: 'Pre-lay shed',
};

type DayWindow = NonNullable<PairingDetail['laying']>;
const sayWindow = ({ from, usual, to }: DayWindow) =>
  `about ${sayDay(usual)} (${sayDay(from)} – ${sayDay(to)})`;

/** What was seen of the pairing, and when what is still to come is expected. */
export function PairingProgress({ pairing }: { pairing: PairingDetail }) {
  const { slug } = useWorkspace();
  const { laying, hatching, events, clutches } = pairing;
  return (
    <Panel
      title="In the room"
      aside={pairing.status === 'withdrawn' ? undefined : `forecast from: ${pairing.forecastFrom}`}
    >
      <dl className="flex flex-col gap-1 text-base">
        {laying ? (
          <div>
            <dt className="inline text-ink-2">Laying expected </dt>
            <dd className="inline">{sayWindow(laying)}</dd>
          </div>
        ) : null}
        {hatching ? (
          <div>
            <dt className="inline text-ink-2">Hatching expected </dt>
            <dd className="inline">{sayWindow(hatching)}</dd>
          </div>
        ) : null}
      </dl>
      {events.length > 0 ? (
        <ol className="mt-3 divide-y divide-rule-2 border-t border-rule-2 text-base">
          {events.map((event) => (
            <li
              key={event.id}
              className={`flex justify-between gap-4 py-1.5 ${event.retracted ? 'text-ink-3 line-through' : ''}`}
            >
              <span>
                {eventWords[event.kind]}
                {event.minutes ? `, ${event.minutes} min` : ''}
                {event.note ? <span className="block text-sm text-ink-2">{event.note}</span> : null}
              </span>
              <span className="text-right whitespace-nowrap">
                {sayDay(event.seenOn)}
                <span className="block text-sm text-ink-3">{event.by}</span>
              </span>
            </li>
          ))}
        </ol>
      ) : (
        <p className="mt-2 text-sm text-ink-3">Nothing was seen yet.</p>
      )}
      {clutches.map((clutch) => (
        <p key={clutch.id} className="mt-3 text-base">
          <Link
            href={`/${slug}/clutches/${clutch.id}`}
            className="font-mono font-semibold text-slate underline"
          >
            {clutch.code}
          </Link>{' '}
          laid {sayDay(clutch.laidOn)}: {clutch.eggs} eggs{clutch.slugs ? `, ${clutch.slugs} slugs` : ''}
          {clutch.hatchedOn ? `, hatched ${sayDay(clutch.hatchedOn)}` : ''}
        </p>
      ))}
    </Panel>
  );
}
