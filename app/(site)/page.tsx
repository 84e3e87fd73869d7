import Link from 'next/link';
import { redirect } from 'next/navigation';
import { Notice } from '@/components/ui/notice';
import { buttonClasses } from '@/components/ui/button';
import { pageCaller } from '@/lib/api/page';
import { perform } from '@/lib/use-cases/perform';
import { showMeUseCase } from '@/lib/use-cases/workspace/show-me';

const points = [
  [
    'Whose it is',
    'Every animal is owned in whole parts with dates. A hatchling’s parts follow from its parents’ and from what the partners agreed.',
  ],
  [
    'What can hatch',
    'Odds as fractions over any number of loci, with uncertain parents counted as one clutch, not as independent eggs.',
  ],
  [
    'What was agreed',
    'Terms and pairings are versions that all parties agree to, and that can be shown later exactly as they were.',
  ],
];

/** The public page; a signed-in person goes straight to their workspace. */
export default async function FrontPage() {
  const caller = await pageCaller();
  const me = caller.person ? await perform(showMeUseCase, caller, {}) : null;
  const first = me?.workspaces[0];
  if (first) redirect(`/${first.slug}`);
  return (
    <div className="mx-auto w-full max-w-3xl pt-8">
      <h1 className="text-3xl">Joint breeding projects, to the last egg and the last cent</h1>
      <p className="mt-4 max-w-2xl text-lg text-ink-2">
        Moiety is where people who co-own breeding reptiles run their projects: animals and lineage, pairings
        that all partners agree to, clutches and hatchlings.
      </p>
      {me ? (
        <Notice className="mt-6" title={`You are signed in as ${me.name}`}>
          You are not a member of a workspace yet. Ask its owner to invite {me.email}.
        </Notice>
      ) : (
        <div className="mt-6 flex flex-wrap gap-3">
          <Link href="/sign-in" className={buttonClasses({ tone: 'primary', size: 'lg' })}>
            Sign in
          </Link>
          <Link href="/sign-up" className={buttonClasses({ size: 'lg' })}>
            Make an account
          </Link>
        </div>
      )}
      <dl className="mt-12 grid gap-8 sm:grid-cols-3">
        {points.map(([term, text]) => (
          <div key={term} className="border-t-2 border-ink pt-3">
            <dt className="font-heading text-lg font-semibold">{term}</dt>
            <dd className="mt-1 text-ink-2">{text}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
