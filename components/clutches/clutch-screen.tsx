'use client';

import Link from 'next/link';
import { useShares } from '@/components/collection/shares-of';
import { ShareStrip } from '@/components/drawings/share-strip';
import { sayDay } from '@/components/drawings/season-days';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { ErrorState } from '@/components/ui/error-state';
import { Panel } from '@/components/ui/panel';
import { PlainTable } from '@/components/ui/plain-table';
import { SkeletonText } from '@/components/ui/skeleton';
import { useClutch } from '@/lib/client/clutches';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { ClutchDetail } from '@/lib/contracts/clutch';
import type { ClutchId } from '@/lib/contracts/ids';
import { clutchStateWords } from './clutches-screen';
import { HatchlingForm } from './hatchling-form';

/** A clutch: its facts, what may hatch, whose it will be, and its young. */
export function ClutchScreen({ id }: { id: ClutchId }) {
  const { slug } = useWorkspace();
  const query = useClutch(id);
  const back = { href: `/${slug}/clutches`, label: 'Clutches' };
  if (query.data) return <ClutchPage clutch={query.data} />;
  return (
    <>
      <PageHeader title="Clutch" back={back} />
      <PageBody>
        {query.isError ? (
          <ErrorState onRetry={() => void query.refetch()} retrying={query.isFetching}>
            {query.error.problem.detail}
          </ErrorState>
        ) : (
          <SkeletonText lines={12} />
        )}
      </PageBody>
    </>
  );
}

function ClutchPage({ clutch }: { clutch: ClutchDetail }) {
  const { slug } = useWorkspace();
  const shares = useShares();
  const mayLog = useMay('clutch.log');
  const left = clutch.eggs - clutch.hatchlings;
  const pip = clutch.pipExpected;
  const facts: [string, string | null][] = [
    ['Laid', sayDay(clutch.laidOn)],
    ['Eggs', `${clutch.eggs}${clutch.slugs ? ` and ${clutch.slugs} slugs` : ''}`],
    ['Clutch weight', clutch.clutchGrams === null ? null : `${clutch.clutchGrams} g`],
    ['Incubator', clutch.incubatorLabel || null],
    [
      'Kept at',
      clutch.incubationDecicelsius === null ? null : `${(clutch.incubationDecicelsius / 10).toFixed(1)} °C`,
    ],
    ['First pip', pip ? `about ${sayDay(pip.usual)} (${sayDay(pip.from)} – ${sayDay(pip.to)})` : null],
    ['Hatched', clutch.hatchedOn ? sayDay(clutch.hatchedOn) : null],
    ['Note', clutch.note || null],
  ];
  return (
    <>
      <PageHeader
        back={{ href: `/${slug}/clutches`, label: 'Clutches' }}
        title={`Clutch ${clutch.code}`}
        meta={
          <>
            {clutchStateWords[clutch.state]} ·{' '}
            <Link href={`/${slug}/season/pairings/${clutch.pairingId}`} className="underline">
              {clutch.sire.code} × {clutch.dam.code}
            </Link>{' '}
            · {clutch.project.name}
          </>
        }
      />
      <PageBody>
        <div className="grid min-w-0 items-start gap-5 lg:grid-cols-3">
          <Panel title="The clutch">
            <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1">
              {facts.map(([word, value]) =>
                value === null ? null : (
                  <div key={word} className="contents">
                    <dt className="text-ink-2">{word}</dt>
                    <dd>{value}</dd>
                  </div>
                ),
              )}
            </dl>
          </Panel>
          <Panel title="What may hatch">
            <PlainTable
              label="What may hatch"
              rows={clutch.possibleLooks}
              rowKey={({ key }) => key}
              columns={[
                { id: 'look', header: 'Looks', cell: ({ label }) => label },
                { id: 'odds', header: 'Odds', align: 'end', cell: ({ odds }) => odds },
              ]}
            />
          </Panel>
          <Panel title="Whose the young are" aside={`terms v${clutch.terms.number}`}>
            <ShareStrip
              shares={shares(clutch.derivation.parts)}
              labels="parts"
              size="md"
              label="Parts of each young"
            />
            <ol className="mt-3 list-decimal space-y-1 pl-5 text-sm text-ink-2">
              {clutch.derivation.steps.map((step) => (
                <li key={step}>{step}</li>
              ))}
            </ol>
          </Panel>
        </div>
        {clutch.young.length > 0 ? (
          <Panel title="Young" aside={`${clutch.hatchlings} of ${clutch.eggs} eggs`} className="mt-5">
            <PlainTable
              label="Young"
              rows={clutch.young}
              rowKey={({ id }) => id}
              columns={[
                { id: 'number', header: 'No.', cell: ({ hatchNumber }) => hatchNumber ?? '–' },
                {
                  id: 'code',
                  header: 'Code',
                  cell: ({ id, code }) => (
                    <Link href={`/${slug}/collection/${id}`} className="font-mono underline">
                      {code}
                    </Link>
                  ),
                },
                { id: 'sex', header: 'Sex', cell: ({ sex }) => sex },
                {
                  id: 'looks',
                  header: 'Looks',
                  cell: ({ looksLike, alive }) => `${looksLike}${alive ? '' : ' (died)'}`,
                },
                {
                  id: 'grams',
                  header: 'Weight',
                  align: 'end',
                  cell: ({ grams }) => (grams === null ? '–' : `${grams} g`),
                },
                {
                  id: 'parts',
                  header: 'Owners',
                  cell: ({ code, parts }) => (
                    <ShareStrip shares={shares(parts)} label={`Owners of ${code}`} />
                  ),
                },
              ]}
            />
          </Panel>
        ) : null}
        {mayLog && left > 0 ? (
          <Panel title="Log hatchlings" aside={`${left} more can hatch`} className="mt-5">
            <HatchlingForm key={clutch.hatchlings} clutch={clutch} />
          </Panel>
        ) : null}
      </PageBody>
    </>
  );
}
