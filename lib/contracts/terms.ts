import { z } from 'zod';
import { decisionFields, myPart, saysWhichChange, standing, whichChange } from './agreement';
import { contract, instant, isoDay, minorUnits } from './contract';
import { partyId, projectId, termsId } from './ids';
import { inProject, termsStatus } from './project';
import { termsContent, termsDraft } from './terms-content';

export const inTerms = inProject.extend({ terms: termsId });

/** One clause in words, with what it was before when it differs; `before` is null in a first version. */
export const clauseLine = z.object({
  title: z.string(),
  text: z.string(),
  before: z.string().nullable(),
  changed: z.boolean(),
});
export type ClauseLine = z.infer<typeof clauseLine>;

const termsRow = z.object({
  id: termsId,
  number: z.int(),
  status: termsStatus,
  inForceFrom: isoDay,
  /** In force today. */
  inForce: z.boolean(),
  note: z.string(),
  proposedBy: z.string(),
  proposedByParty: partyId.nullable(),
  proposedAt: instant.nullable(),
  lockedAt: instant.nullable(),
  hash: z.string().nullable(),
  agreed: z.int(),
  of: z.int(),
  content: termsContent,
});

export const listTerms = contract({
  id: 'terms.list',
  method: 'GET',
  path: '/workspaces/{workspace}/projects/{project}/terms',
  summary: 'Every version of the terms of a project, newest first',
  access: { scope: 'workspace', action: 'terms.see' },
  params: inProject,
  response: z.object({ versions: z.array(termsRow) }),
});

export const showTerms = contract({
  id: 'terms.show',
  method: 'GET',
  path: '/workspaces/{workspace}/projects/{project}/terms/{terms}',
  summary: 'A version of terms, clause by clause beside the version before, and who stands where',
  access: { scope: 'workspace', action: 'terms.see' },
  params: inTerms,
  response: termsRow.extend({
    project: z.object({ id: projectId, name: z.string() }),
    version: z.int(),
    comparedWith: z.object({ id: termsId, number: z.int() }).nullable(),
    clauses: z.array(clauseLine),
    standings: z.array(standing),
    me: myPart,
    mayPropose: z.boolean(),
  }),
});
export type TermsDetail = z.infer<typeof showTerms.response>;

const splitCut = z.object({
  label: z.string(),
  amount: minorUnits,
  partyId: partyId.nullable(),
  note: z.string(),
});
export const splitStep = z.object({ label: z.string(), amount: minorUnits, cuts: z.array(splitCut) });

export const previewTerms = contract({
  id: 'terms.preview',
  method: 'POST',
  path: '/workspaces/{workspace}/projects/{project}/terms/preview',
  summary: 'How an example sale would be split by drafted terms, and what they change; writes nothing',
  access: { scope: 'workspace', action: 'terms.see' },
  params: inProject,
  body: z.object({
    content: termsDraft,
    /** Price of the animal in the example, the card fee on it and the costs of its clutch. */
    price: minorUnits.min(1, 'More than nothing.').default(100_000),
    cardFee: minorUnits.min(0).default(0),
    costs: minorUnits.min(0).default(0),
  }),
  response: z.object({
    /** Whose the parents of the example are. */
    example: z.string(),
    steps: z.array(splitStep),
    clauses: z.array(clauseLine),
    comparedWith: z.int().nullable(),
  }),
});
export type TermsPreview = z.infer<typeof previewTerms.response>;

export const proposeTerms = contract({
  id: 'terms.propose',
  method: 'POST',
  path: '/workspaces/{workspace}/projects/{project}/terms',
  summary: 'Propose a version of terms; it takes the place of a version that is still open',
  access: { scope: 'workspace', action: 'terms.propose' },
  params: inProject,
  body: z.object({
    content: termsDraft,
    inForceFrom: isoDay,
    note: z.string().trim().max(2000).default(''),
    /** The open version that this one replaces; null when none was seen to be open. */
    replaces: termsId.nullable().default(null),
  }),
  response: z.object({ id: termsId, number: z.int(), status: termsStatus }),
  idempotent: true,
});

export const decideTerms = contract({
  id: 'terms.decide',
  method: 'POST',
  path: '/workspaces/{workspace}/projects/{project}/terms/{terms}/decisions',
  summary: 'A party agrees to a version of terms or asks for a change; agreed by all, it is locked',
  access: { scope: 'workspace', action: 'terms.decide' },
  params: inTerms,
  body: z.object(decisionFields).refine(saysWhichChange, whichChange),
  response: z.object({ status: termsStatus, agreed: z.int(), of: z.int() }),
});

export const withdrawTerms = contract({
  id: 'terms.withdraw',
  method: 'POST',
  path: '/workspaces/{workspace}/projects/{project}/terms/{terms}/withdrawal',
  summary: 'Withdraw a version of terms that is not agreed',
  access: { scope: 'workspace', action: 'terms.propose' },
  params: inTerms,
  body: z.object({ version: z.int(), reason: z.string().trim().max(500).default('') }),
  response: z.object({ status: termsStatus }),
});
