'use client';

import { useEffect, useMemo, useState } from 'react';
import { usePairingPreview, type PreviewInput } from '@/lib/client/season';
import type { AnimalId, ProjectId } from '@/lib/contracts/ids';
import type { PairingDetail } from '@/lib/contracts/pairing';

/** What a person has chosen and typed; null = not touched, the preview's value holds. */
export interface ProposalForm {
  projectId: string | null;
  sireId: string | null;
  damId: string | null;
  startsOn: string | null;
  endsOn: string | null;
  eggsExpected: number | null;
  prices: Record<string, number> | null;
  note: string;
  acknowledged: string[];
  answerBy: string;
}

const blank: ProposalForm = {
  projectId: null,
  sireId: null,
  damId: null,
  startsOn: null,
  endsOn: null,
  eggsExpected: null,
  prices: null,
  note: '',
  acknowledged: [],
  answerBy: '',
};

/** The form of a proposal begins empty, or with the version that is to be changed. */
function startOf(again: PairingDetail | undefined, project: string | null): ProposalForm {
  const version = again?.versions[0];
  if (!again || !version) return { ...blank, projectId: project };
  const { plan } = version;
  return {
    projectId: again.project.id,
    sireId: again.sire.id,
    damId: again.dam.id,
    startsOn: plan.startsOn,
    endsOn: plan.endsOn,
    eggsExpected: plan.eggsExpected,
    prices: plan.prices ?? null,
    note: plan.note,
    acknowledged: plan.acknowledgedCautions,
    answerBy: '',
  };
}

/** State of the form, with the figures that follow from it a moment after the last change. */
export function useProposal(again: PairingDetail | undefined, project: string | null) {
  const [form, setForm] = useState(() => startOf(again, project));
  const [touched, setTouched] = useState(false);
  const change = (part: Partial<ProposalForm>) => {
    setTouched(true);
    setForm((before) => ({ ...before, ...part }));
  };
  const body = useMemo<PreviewInput | null>(() => {
    if (!form.projectId || !form.sireId || !form.damId) return null;
    const eggs = form.eggsExpected;
    return {
      projectId: form.projectId as ProjectId,
      sireId: form.sireId as AnimalId,
      damId: form.damId as AnimalId,
      startsOn: form.startsOn || undefined,
      endsOn: form.endsOn || undefined,
      eggsExpected: eggs !== null && Number.isInteger(eggs) && eggs >= 1 && eggs <= 120 ? eggs : undefined,
      prices: form.prices ?? undefined,
    };
  }, [form]);
  const [asked, setAsked] = useState(body);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(body), 250);
    return () => clearTimeout(timer);
  }, [body]);
  const preview = usePairingPreview(asked);
  useEffect(() => {
    if (!touched) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [touched]);
  return { form, change, preview, settle: () => setTouched(false) };
}
