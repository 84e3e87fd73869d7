import { redirect } from 'next/navigation';

/** A workspace opens at its collection, which every role may see. */
export default async function WorkspacePage({ params }: { params: Promise<{ workspace: string }> }) {
  const { workspace } = await params;
  redirect(`/${workspace}/collection`);
}
