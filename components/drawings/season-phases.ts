import type { ReactNode } from 'react';

export type PhaseKind = 'pairing' | 'gestation' | 'lay' | 'incubation' | 'hatch' | 'other';
export type MomentKind = 'lock' | 'follicles' | 'ovulation' | 'shed' | 'lay' | 'pip' | 'hatch' | 'other';
/** Planned by people, expected by forecast, observed in the room. */
export type Certainty = 'planned' | 'expected' | 'observed';

/** A span of ISO days, both included. */
export type RibbonPhase = { kind: PhaseKind; from: string; to: string; certainty: Certainty; label?: string };
export type RibbonMoment = { kind: MomentKind; day: string; certainty: Certainty; label?: string };

export type RibbonLane = {
  id: string;
  /** Plain name, spoken: "BP-014 × BP-102". */
  name: string;
  /** What stands at the head of the lane; may hold links. */
  heading: ReactNode;
  phases: readonly RibbonPhase[];
  moments?: readonly RibbonMoment[];
  /** A draft: drawn in grey. */
  muted?: boolean;
};

type Tone = 'slate' | 'straw' | 'moss' | 'ember' | 'neutral';

export const phaseNames: Record<PhaseKind, string> = {
  pairing: 'pairing',
  gestation: 'gestation',
  lay: 'lay',
  incubation: 'incubation',
  hatch: 'hatch',
  other: '',
};

const phaseTones: Record<PhaseKind, Tone> = {
  pairing: 'slate',
  gestation: 'straw',
  lay: 'ember',
  incubation: 'straw',
  hatch: 'moss',
  other: 'neutral',
};

const looks: Record<Tone, Record<Certainty, string>> = {
  slate: {
    observed: 'bg-slate text-on-slate border-slate',
    expected: 'bg-slate-tint text-slate-deep border-slate',
    planned: 'bg-paper text-slate-deep border-slate border-dashed',
  },
  straw: {
    observed: 'bg-straw text-on-straw border-straw',
    expected: 'bg-straw-tint text-straw-deep border-straw',
    planned: 'bg-paper text-straw-deep border-straw border-dashed',
  },
  moss: {
    observed: 'bg-moss text-on-moss border-moss',
    expected: 'bg-moss-tint text-moss-deep border-moss',
    planned: 'bg-paper text-moss-deep border-moss border-dashed',
  },
  ember: {
    observed: 'bg-ember text-on-ember border-ember',
    expected: 'bg-ember-tint text-ember-deep border-ember',
    planned: 'bg-paper text-ember-deep border-ember border-dashed',
  },
  neutral: {
    observed: 'bg-ink-3 text-paper border-ink-3',
    expected: 'bg-rule-2 text-ink-2 border-edge',
    planned: 'bg-paper text-ink-2 border-edge border-dashed',
  },
};

/** Class names of a phase's bar: solid for what has happened, a band for what is expected, dashes for what is planned. */
export function phaseLook(kind: PhaseKind, certainty: Certainty, muted = false): string {
  return looks[muted ? 'neutral' : phaseTones[kind]][certainty];
}

export const moments: Record<MomentKind, { letters: string; name: string; tone: Tone }> = {
  lock: { letters: 'lo', name: 'lock', tone: 'slate' },
  follicles: { letters: 'fo', name: 'follicle check', tone: 'slate' },
  ovulation: { letters: 'ov', name: 'ovulation', tone: 'ember' },
  shed: { letters: 'sh', name: 'pre-lay shed', tone: 'slate' },
  lay: { letters: 'ly', name: 'laid', tone: 'straw' },
  pip: { letters: 'pi', name: 'pip', tone: 'moss' },
  hatch: { letters: 'ha', name: 'hatch', tone: 'moss' },
  other: { letters: '·', name: 'note', tone: 'neutral' },
};

export function momentLook(kind: MomentKind, certainty: Certainty, muted = false): string {
  return looks[muted ? 'neutral' : moments[kind].tone][certainty];
}
