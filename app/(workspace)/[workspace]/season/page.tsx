import type { Metadata } from 'next';
import { createLoader } from 'nuqs/server';
import { SeasonScreen } from '@/components/season/season-screen';
import { seasonParams, seasonQueryOf } from '@/components/season/season-params';
import { Prefetch, prefetched } from '@/lib/api/page';
import { showSeason } from '@/lib/contracts/season';
import { showSeasonUseCase } from '@/lib/use-cases/season/show-season';

export const metadata: Metadata = { title: 'Season' };
const readSearch = createLoader(seasonParams);

export default async function SeasonPage(props: {
  params: Promise<{ workspace: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const { workspace } = await props.params;
  const query = seasonQueryOf(readSearch(await props.searchParams));
  // An address that somebody mangled shows the whole season rather than an error.
  const isSound = showSeason.query.safeParse(query).success;
  return (
    <Prefetch
      from={`/${workspace}/season`}
      queries={isSound ? [prefetched(showSeasonUseCase, { params: { workspace }, query })] : []}
    >
      <SeasonScreen />
    </Prefetch>
  );
}
