'use client';

import Link from 'next/link';
import { Checkbox } from '@/components/ui/checkbox';
import { DateInput } from '@/components/ui/date-input';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberInput } from '@/components/ui/number-input';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { useBreeders } from '@/lib/client/season';
import { useWorkspace } from '@/lib/client/workspace';
import type { ProjectId } from '@/lib/contracts/ids';
import type { PairingPreview } from '@/lib/contracts/pairing';
import { BreederPicker } from './breeder-picker';
import type { ProposalForm } from './propose-state';

/** What is chosen of a pairing: project, animals, days, eggs, a note, and the cautions that must be read. */
export function ProposeFields({
  form,
  change,
  preview,
  isAgain,
  messageFor,
}: {
  form: ProposalForm;
  change: (part: Partial<ProposalForm>) => void;
  preview: PairingPreview | undefined;
  /** Project and animals of a pairing stay; only the plan changes. */
  isAgain: boolean;
  messageFor: (field: string) => string | undefined;
}) {
  const { slug, projects } = useWorkspace();
  const breeders = useBreeders(isAgain ? null : (form.projectId as ProjectId | null));
  const cautions = preview?.figures.cautions ?? [];
  const projectMessage = messageFor('projectId');
  return (
    <Panel title="The plan">
      <div className="flex flex-col gap-4">
        {isAgain ? null : (
          <>
            <Field label="Project" required error={projectMessage}>
              <Select
                placeholder="Choose …"
                value={form.projectId ?? ''}
                onChange={(event) =>
                  change({ projectId: event.target.value || null, sireId: null, damId: null, prices: null })
                }
                options={projects.map(({ id, name }) => ({ value: id, label: name }))}
              />
            </Field>
            <BreederPicker
              label="Sire"
              options={breeders.data?.sires ?? []}
              loading={breeders.isFetching}
              value={form.sireId}
              onChange={(sireId) => change({ sireId, prices: null })}
              error={messageFor('sireId')}
            />
            <BreederPicker
              label="Dam"
              options={breeders.data?.dams ?? []}
              loading={breeders.isFetching}
              value={form.damId}
              onChange={(damId) => change({ damId, prices: null })}
              error={messageFor('damId')}
            />
          </>
        )}
        {projectMessage && form.projectId ? (
          <Link href={`/${slug}/projects/${form.projectId}`} className="text-base text-slate underline">
            Open the project
          </Link>
        ) : null}
        <div className="grid grid-cols-2 gap-3">
          <Field label="Together from" error={messageFor('startsOn')}>
            <DateInput
              value={form.startsOn ?? preview?.plan.startsOn ?? ''}
              onChange={(event) => change({ startsOn: event.target.value || null })}
            />
          </Field>
          <Field label="until" error={messageFor('endsOn')}>
            <DateInput
              value={form.endsOn ?? preview?.plan.endsOn ?? ''}
              onChange={(event) => change({ endsOn: event.target.value || null })}
            />
          </Field>
        </div>
        <Field
          label="Eggs expected"
          hint="The species’ usual clutch unless you know better."
          error={messageFor('eggsExpected')}
        >
          <NumberInput
            whole
            value={form.eggsExpected ?? preview?.plan.eggsExpected ?? null}
            onChange={(eggsExpected) => change({ eggsExpected })}
          />
        </Field>
        <Field label="Note to the others" optional error={messageFor('note')}>
          <Textarea
            rows={3}
            maxLength={2000}
            value={form.note}
            onChange={(event) => change({ note: event.target.value })}
          />
        </Field>
        <Field label="Answer by" optional error={messageFor('answerBy')}>
          <DateInput value={form.answerBy} onChange={(event) => change({ answerBy: event.target.value })} />
        </Field>
        {cautions.length > 0 ? (
          <Notice tone="alarm" title="Read before you propose">
            <div className="flex flex-col gap-2">
              {cautions.map(({ text }) => (
                <Checkbox
                  key={text}
                  label={`I have read: ${text}`}
                  checked={form.acknowledged.includes(text)}
                  onChange={() =>
                    change({
                      acknowledged: form.acknowledged.includes(text)
                        ? form.acknowledged.filter((one) => one !== text)
                        : [...form.acknowledged, text],
                    })
                  }
                />
              ))}
            </div>
          </Notice>
        ) : null}
        {messageFor('acknowledgedCautions') ? (
          <p className="text-sm font-medium text-alarm">{messageFor('acknowledgedCautions')}</p>
        ) : null}
      </div>
    </Panel>
  );
}
