'use client';

import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { NumberInput } from '@/components/ui/number-input';
import { Panel } from '@/components/ui/panel';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { useWorkspace } from '@/lib/client/workspace';
import type { PartyId } from '@/lib/contracts/ids';
import type { TermsDraft } from '@/lib/contracts/terms-content';

interface Props {
  draft: TermsDraft;
  change: (part: Partial<TermsDraft>) => void;
  parties: readonly { id: PartyId; name: string; mark: number }[];
  messageFor: (field: string) => string | undefined;
}

/** Everything that a version of terms says. */
export function TermsFields({ draft, change, parties, messageFor }: Props) {
  return (
    <>
      <SidesPanel draft={draft} change={change} parties={parties} messageFor={messageFor} />
      <Panel title="The young">
        <Field label="How they are divided" error={messageFor('content.division')}>
          <Select
            value={draft.division}
            onChange={(event) => change({ division: event.target.value as TermsDraft['division'] })}
            options={[
              { value: 'proceeds', label: 'They are sold and the proceeds are divided' },
              { value: 'picks', label: 'They are picked in turns, in order of rank' },
              { value: 'parts', label: 'Each party holds its parts of each of them' },
            ]}
          />
        </Field>
      </Panel>
      <ClausesPanel draft={draft} change={change} messageFor={messageFor} />
    </>
  );
}

function SidesPanel({ draft, change, parties, messageFor }: Props) {
  const { parties: all } = useWorkspace();
  const payees = [
    ...parties,
    ...all.filter(({ id, kind }) => kind === 'house' && !parties.some((party) => party.id === id)),
  ];
  const whole = (value: number | null) => (value === null || Number.isNaN(value) ? 0 : value);
  const { houseShare } = draft;
  return (
    <Panel title="Who gets what">
      <div className="flex flex-col gap-4">
        <div className="grid grid-cols-2 gap-3">
          <Field label="Dam side" hint="parts to her owners" error={messageFor('content.damSide')}>
            <NumberInput
              whole
              value={draft.damSide}
              onChange={(value) => change({ damSide: whole(value) })}
            />
          </Field>
          <Field label="Sire side" hint="parts to his owners" error={messageFor('content.sireSide')}>
            <NumberInput
              whole
              value={draft.sireSide}
              onChange={(value) => change({ sireSide: whole(value) })}
            />
          </Field>
        </div>
        <Checkbox
          label="A house share comes off the top"
          hint="For the building, heat and care, before anything is divided."
          checked={houseShare !== null}
          onChange={() =>
            change(
              houseShare
                ? { houseShare: null, cardFees: 'off_the_top' }
                : {
                    houseShare: {
                      partyId:
                        payees.find(({ id }) => all.find((party) => party.id === id)?.kind === 'house')?.id ??
                        (payees[0]?.id as PartyId),
                      basisPoints: 800,
                    },
                  },
            )
          }
        />
        {houseShare ? (
          <div className="grid grid-cols-[8rem_minmax(0,1fr)] gap-3">
            <Field label="Share" error={messageFor('content.houseShare.basisPoints')}>
              <NumberInput
                unit="%"
                value={houseShare.basisPoints / 100}
                onChange={(value) =>
                  change({
                    houseShare: {
                      ...houseShare,
                      basisPoints: value === null || Number.isNaN(value) ? 0 : Math.round(value * 100),
                    },
                  })
                }
              />
            </Field>
            <Field label="goes to" error={messageFor('content.houseShare.partyId')}>
              <Select
                value={houseShare.partyId}
                onChange={(event) =>
                  change({ houseShare: { ...houseShare, partyId: event.target.value as PartyId } })
                }
                options={payees.map(({ id, name }) => ({ value: id, label: name }))}
              />
            </Field>
          </div>
        ) : null}
        <Checkbox
          label="Costs of a clutch are recovered first"
          hint="Recorded costs go back to who paid them before anything is divided."
          checked={draft.costsFirst}
          onChange={() => change({ costsFirst: !draft.costsFirst })}
        />
        <Field label="Fees of card payments" error={messageFor('content.cardFees')}>
          <Select
            value={draft.cardFees}
            onChange={(event) => change({ cardFees: event.target.value as TermsDraft['cardFees'] })}
            options={[
              { value: 'off_the_top', label: 'come off the top: all bear them' },
              { value: 'house', label: 'come out of the house share', disabled: houseShare === null },
            ]}
          />
        </Field>
      </div>
    </Panel>
  );
}

function ClausesPanel({ draft, change, messageFor }: Omit<Props, 'parties'>) {
  const clause = (key: keyof TermsDraft['clauses'], label: string, hint: string) => (
    <Field label={label} hint={hint} optional error={messageFor(`content.clauses.${key}`)}>
      <Textarea
        rows={2}
        maxLength={2000}
        value={draft.clauses[key]}
        onChange={(event) => change({ clauses: { ...draft.clauses, [key]: event.target.value } })}
      />
    </Field>
  );
  return (
    <Panel title="In words">
      <div className="flex flex-col gap-4">
        {clause('death', 'If an animal dies', 'Who carries the loss, and whether it is replaced.')}
        {clause('exit', 'Exit and buy-out', 'How a party leaves, and what its parts are worth then.')}
        {clause('notice', 'Notice and duration', 'How long this holds, and how it ends.')}
      </div>
    </Panel>
  );
}
