import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { TermsScreen } from '@/components/projects/terms-screen';
import { Prefetch, prefetched } from '@/lib/api/page';
import { projectId, termsId } from '@/lib/contracts/ids';
import { showTermsUseCase } from '@/lib/use-cases/projects/show-terms';

export const metadata: Metadata = { title: 'Terms' };

export default async function TermsPage(props: {
  params: Promise<{ workspace: string; project: string; terms: string }>;
  searchParams: Promise<{ decide?: string }>;
}) {
  const { workspace, project, terms } = await props.params;
  const { decide } = await props.searchParams;
  const ids = { project: projectId.safeParse(project).data, terms: termsId.safeParse(terms).data };
  if (!ids.project || !ids.terms) notFound();
  const from = `/${workspace}/projects/${ids.project}/terms/${ids.terms}${decide === '1' ? '?decide=1' : ''}`;
  return (
    <Prefetch
      from={from}
      queries={[
        prefetched(showTermsUseCase, { params: { workspace, project: ids.project, terms: ids.terms } }),
      ]}
    >
      <TermsScreen project={ids.project} terms={ids.terms} />
    </Prefetch>
  );
}
