import { z } from 'zod';
import { decisionFields, myPart, saysWhichChange, standing, versionChange, whichChange } from './agreement';
import { pairingEvent } from './clutch';
import { contract, inWorkspace, instant, isoDay, minorUnits, pageOf } from './contract';
import { animalId, clutchId, pairingId, pairingVersionId, partyId, projectId, termsId } from './ids';
import { outcomeRow, pairingFigures, pairingPlan } from './pairing-figures';
import { pairingStatus } from './project';

export const inPairing = inWorkspace.extend({ pairing: pairingId });

/** The figures as the caller may see them: whoever may not see worth gets no price and no proceeds at all. */
export const seenFigures = pairingFigures.extend({
  outcomes: z.array(outcomeRow.omit({ price: true }).extend({ price: minorUnits.nullable().optional() })),
  proceeds: pairingFigures.shape.proceeds.optional(),
  /** Null in a preview before any terms are agreed. */
  termsId: termsId.nullable(),
  termsNumber: z.int().nullable(),
});
export type SeenFigures = z.infer<typeof seenFigures>;
export const seenPlan = pairingPlan.extend({ prices: pairingPlan.shape.prices.optional() });

const planFields = {
  startsOn: isoDay,
  endsOn: isoDay,
  eggsExpected: z.int('Whole eggs.').min(1, 'At least one egg.').max(120),
  note: z.string().trim().max(2000).default(''),
  prices: pairingPlan.shape.prices.default({}),
};
const inOrder = ({ startsOn, endsOn }: { startsOn: string; endsOn: string }) => startsOn <= endsOn;
const order = { error: 'The last day is before the first.', path: ['endsOn'] };

export const previewPairing = contract({
  id: 'pairings.preview',
  method: 'POST',
  path: '/workspaces/{workspace}/season/preview',
  summary: 'What a pairing could give, at what odds, what it would be worth and to whom; writes nothing',
  access: { scope: 'workspace', action: 'pairing.see' },
  body: z
    .object({
      projectId,
      sireId: animalId,
      damId: animalId,
      startsOn: isoDay.optional(),
      endsOn: isoDay.optional(),
      eggsExpected: planFields.eggsExpected.optional(),
      /** Prices per outcome key in minor units; what is left out takes the median of earlier sales of the same look. */
      prices: pairingPlan.shape.prices.optional(),
    })
    .refine(({ startsOn, endsOn }) => !startsOn || !endsOn || startsOn <= endsOn, order),
  response: z.object({
    figures: seenFigures,
    plan: seenPlan,
    season: z.int(),
    /** What keeps this from being proposed; empty when nothing does. */
    obstacles: z.array(z.object({ field: z.string(), message: z.string() })),
    /** Outcome keys whose price is a median of earlier sales, with how many. */
    medians: z.record(z.string(), z.int()).optional(),
  }),
});
export type PairingPreview = z.infer<typeof previewPairing.response>;

const proposal = {
  ...planFields,
  acknowledgedCautions: z.array(z.string()).default([]),
  answerBy: isoDay.nullable().default(null),
};

export const proposePairing = contract({
  id: 'pairings.propose',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings',
  summary: 'Propose a pairing to the parties of a project; the figures are kept with the proposal',
  access: { scope: 'workspace', action: 'pairing.propose' },
  body: z.object({ projectId, sireId: animalId, damId: animalId, ...proposal }).refine(inOrder, order),
  response: z.object({ id: pairingId, versionId: pairingVersionId, number: z.int(), status: pairingStatus }),
  idempotent: true,
});

export const proposePairingAgain = contract({
  id: 'pairings.propose-again',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings/{pairing}/versions',
  summary:
    'Propose a new version of a pairing that is not agreed yet; what was answered to the version before no longer counts',
  access: { scope: 'workspace', action: 'pairing.propose' },
  params: inPairing,
  body: z
    .object({
      /** The version that the proposer saw. */
      seen: z.int(),
      ...proposal,
    })
    .refine(inOrder, order),
  response: z.object({ versionId: pairingVersionId, number: z.int(), status: pairingStatus }),
  idempotent: true,
});

export const decidePairing = contract({
  id: 'pairings.decide',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings/{pairing}/decisions',
  summary: 'A party agrees to a version of a pairing or asks for a change; agreed by all, it is locked',
  access: { scope: 'workspace', action: 'pairing.decide' },
  params: inPairing,
  body: z.object({ versionId: pairingVersionId, ...decisionFields }).refine(saysWhichChange, whichChange),
  response: z.object({ status: pairingStatus, agreed: z.int(), of: z.int() }),
});

export const withdrawPairing = contract({
  id: 'pairings.withdraw',
  method: 'POST',
  path: '/workspaces/{workspace}/pairings/{pairing}/withdrawal',
  summary: 'Withdraw a proposed pairing',
  access: { scope: 'workspace', action: 'pairing.propose' },
  params: inPairing,
  body: z.object({ version: z.int(), reason: z.string().trim().max(500).default('') }),
  response: z.object({ status: pairingStatus }),
});

const dayWindow = z.object({ from: isoDay, usual: isoDay, to: isoDay });
export const seasonPhase = z.object({
  kind: z.enum(['pairing', 'lay', 'incubation', 'hatch']),
  from: isoDay,
  to: isoDay,
  certainty: z.enum(['planned', 'expected', 'observed']),
});
export const seasonMoment = z.object({
  kind: z.enum(['lock', 'follicles', 'ovulation', 'shed', 'lay', 'hatch', 'other']),
  day: isoDay,
  label: z.string(),
});

export const pairingRow = z.object({
  id: pairingId,
  season: z.int(),
  status: pairingStatus,
  project: z.object({ id: projectId, name: z.string() }),
  title: z.string(),
  sire: z.object({ id: animalId, code: z.string(), name: z.string(), description: z.string() }),
  dam: z.object({ id: animalId, code: z.string(), name: z.string(), description: z.string() }),
  number: z.int(),
  agreed: z.int(),
  of: z.int(),
  waitingFor: z.array(partyId),
  answerBy: isoDay.nullable(),
  /** The caller's party has not answered the open version. */
  waitsForMe: z.boolean(),
  youngParts: z.array(z.object({ partyId, parts: z.int() })),
  eggsExpected: z.int(),
  hatchlingsExpected: z.number(),
  phases: z.array(seasonPhase),
  moments: z.array(seasonMoment),
  laying: dayWindow.nullable(),
  hatching: dayWindow.nullable(),
  forecastFrom: z.string(),
  clutches: z.array(
    z.object({
      id: clutchId,
      code: z.string(),
      laidOn: isoDay,
      hatchedOn: isoDay.nullable(),
      eggs: z.int(),
      slugs: z.int(),
    }),
  ),
  /** Absent for who may not see worth. */
  proceeds: z
    .object({ expected: minorUnits, shares: z.array(z.object({ partyId, amount: minorUnits })) })
    .optional(),
});
export type PairingRow = z.infer<typeof pairingRow>;

export const pairingState = z.enum(['waiting', 'mine', 'agreed', 'change_asked', 'withdrawn']);

export const pairingQuery = {
  season: z.coerce.number().int().min(1990).max(2200).optional(),
  project: projectId.optional(),
  /** Only pairings whose young would be partly this party's. */
  party: partyId.optional(),
  state: pairingState.optional(),
};

export const listPairings = contract({
  id: 'pairings.list',
  method: 'GET',
  path: '/workspaces/{workspace}/pairings',
  summary: 'Pairings with where they stand and when what is expected',
  access: { scope: 'workspace', action: 'pairing.see' },
  query: z.object(pairingQuery),
  response: pageOf(pairingRow),
});

export const pairingVersion = z.object({
  id: pairingVersionId,
  number: z.int(),
  proposedBy: z.string(),
  proposedByParty: partyId.nullable(),
  proposedAt: instant,
  answerBy: isoDay.nullable(),
  lockedAt: instant.nullable(),
  /** SHA-256 that chains this locked version to the one locked before it. */
  hash: z.string().nullable(),
  termsId,
  termsNumber: z.int(),
  plan: seenPlan,
  figures: seenFigures,
  standings: z.array(standing),
  /** What differs from the version before. */
  changes: z.array(versionChange),
});
export type PairingVersion = z.infer<typeof pairingVersion>;

export const showPairing = contract({
  id: 'pairings.show',
  method: 'GET',
  path: '/workspaces/{workspace}/pairings/{pairing}',
  summary:
    'A pairing with every version that was proposed, who stands where, what was seen and what was laid',
  access: { scope: 'workspace', action: 'pairing.see' },
  params: inPairing,
  response: pairingRow.extend({
    version: z.int(),
    /** Newest first. */
    versions: z.array(pairingVersion).min(1),
    me: myPart,
    mayPropose: z.boolean(),
    events: z.array(pairingEvent),
  }),
});
export type PairingDetail = z.infer<typeof showPairing.response>;
