import type { ReactNode } from 'react';
import { WorkspaceShell } from '@/components/shell/workspace-shell';
import { Prefetch, prefetched } from '@/lib/api/page';
import { showWorkspaceUseCase } from '@/lib/use-cases/workspace/show-workspace';

export default async function WorkspaceLayout({
  children,
  params,
}: {
  children: ReactNode;
  params: Promise<{ workspace: string }>;
}) {
  const { workspace } = await params;
  return (
    <Prefetch from={`/${workspace}`} queries={[prefetched(showWorkspaceUseCase, { params: { workspace } })]}>
      <WorkspaceShell>{children}</WorkspaceShell>
    </Prefetch>
  );
}
