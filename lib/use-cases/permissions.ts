import type { Action } from '@/lib/contracts/actions';
import type { Role } from '@/lib/contracts/roles';

/**
 * Who may do what. `all`: on everything in the workspace; `own`: on the projects the member's party is in, the
 * animals it holds parts of, and its own statements; `no`: the action is refused and its screens are not shown.
 */
export type Reach = 'all' | 'own' | 'no';

// prettier-ignore
const permissions: Record<Action, Record<Role, Reach>> = {
  //                        owner            partner           keeper           accountant
  'workspace.see':        { owner: 'all', partner: 'all', keeper: 'all', accountant: 'all' },
  'workspace.configure':  { owner: 'all', partner: 'no', keeper: 'no', accountant: 'no' },
  'people.see':           { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'people.manage':        { owner: 'all', partner: 'no', keeper: 'no', accountant: 'no' },
  'animal.see':           { owner: 'all', partner: 'own', keeper: 'all', accountant: 'all' },
  'animal.edit':          { owner: 'all', partner: 'own', keeper: 'all', accountant: 'no' },
  'animal.import':        { owner: 'all', partner: 'no', keeper: 'no', accountant: 'no' },
  'ownership.see':        { owner: 'all', partner: 'own', keeper: 'all', accountant: 'all' },
  'ownership.transfer':   { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'genetics.see':         { owner: 'all', partner: 'all', keeper: 'all', accountant: 'all' },
  'genetics.edit':        { owner: 'all', partner: 'no', keeper: 'no', accountant: 'no' },
  'tub.see':              { owner: 'all', partner: 'all', keeper: 'all', accountant: 'no' },
  'tub.edit':             { owner: 'all', partner: 'no', keeper: 'all', accountant: 'no' },
  'project.see':          { owner: 'all', partner: 'own', keeper: 'all', accountant: 'all' },
  'project.create':       { owner: 'all', partner: 'all', keeper: 'no', accountant: 'no' },
  'project.edit':         { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'terms.see':            { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'terms.propose':        { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'terms.decide':         { owner: 'own', partner: 'own', keeper: 'no', accountant: 'no' },
  'pairing.see':          { owner: 'all', partner: 'own', keeper: 'all', accountant: 'no' },
  'pairing.worth':        { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'pairing.propose':      { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'pairing.decide':       { owner: 'own', partner: 'own', keeper: 'no', accountant: 'no' },
  'season.log':           { owner: 'all', partner: 'own', keeper: 'all', accountant: 'no' },
  'clutch.see':           { owner: 'all', partner: 'own', keeper: 'all', accountant: 'no' },
  'clutch.log':           { owner: 'all', partner: 'own', keeper: 'all', accountant: 'no' },
  'contact.see':          { owner: 'all', partner: 'all', keeper: 'no', accountant: 'all' },
  'contact.edit':         { owner: 'all', partner: 'all', keeper: 'no', accountant: 'no' },
  'listing.see':          { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'listing.edit':         { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'invoice.see':          { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'invoice.edit':         { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'payment.record':       { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'payment.refund':       { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'ledger.see':           { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'ledger.post':          { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'ledger.configure':     { owner: 'no', partner: 'no', keeper: 'no', accountant: 'all' },
  'ledger.close':         { owner: 'no', partner: 'no', keeper: 'no', accountant: 'all' },
  'ledger.export':        { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'expense.record':       { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'statement.see':        { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'settlement.see':       { owner: 'all', partner: 'own', keeper: 'no', accountant: 'all' },
  'settlement.propose':   { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'settlement.decide':    { owner: 'own', partner: 'own', keeper: 'no', accountant: 'no' },
  'settlement.pay':       { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'audit.see':            { owner: 'all', partner: 'no', keeper: 'no', accountant: 'all' },
  'comment.write':        { owner: 'all', partner: 'own', keeper: 'no', accountant: 'no' },
  'own.see':              { owner: 'all', partner: 'all', keeper: 'all', accountant: 'all' },
};

/** How far a role reaches with an action. */
export function reachOf(role: Role, action: Action): Reach {
  return permissions[action][role];
}

/** The actions a role may do at all, on something. */
export function actionsOf(role: Role): Action[] {
  return (Object.keys(permissions) as Action[]).filter((name) => permissions[name][role] !== 'no');
}
