import 'server-only';
import { Refusal } from './refusal';

interface DatabaseError {
  code: string;
  constraint_name?: string;
  message: string;
}

function findDatabaseError(error: unknown): DatabaseError | null {
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    const code = (at as unknown as { code?: unknown }).code;
    if (typeof code === 'string' && /^[0-9A-Z]{5}$/.test(code)) return at as unknown as DatabaseError;
  }
  return null;
}

/** What to say when a rule of the database is hit that the use case could not see coming (usually: somebody was faster). */
const uniqueRules: Record<string, { field: string; message: string }> = {
  animals_code: { field: 'code', message: 'Another animal already has this code.' },
  parties_name: { field: 'name', message: 'A party of this name is already there.' },
  projects_name: { field: 'name', message: 'A project of this name is already there.' },
  species_name: { field: 'name', message: 'This species is already there.' },
  species_code_prefix: { field: 'codePrefix', message: 'Another species uses these letters.' },
  loci_name: { field: 'name', message: 'This species already has a locus of this name.' },
  accounts_code: { field: 'code', message: 'Another account has this code.' },
  tubs_label: { field: 'label', message: 'Another tub has this label.' },
  clutches_code: { field: 'code', message: 'Another clutch has this code.' },
  pairings_once: { field: 'damId', message: 'These two are already paired in this season.' },
  terms_versions_one_open: { field: '', message: 'A version of these terms is already being agreed on.' },
  workspaces_slug_unique: { field: 'slug', message: 'This address is taken.' },
  members_one_per_person: { field: 'email', message: 'This person is already a member.' },
};

/** Turns what the database refused into a refusal; anything else is passed on as it is. */
export function translateDatabaseError(error: unknown): unknown {
  if (error instanceof Refusal) return error;
  const found = findDatabaseError(error);
  switch (found?.code) {
    case '23505': {
      const rule = uniqueRules[found.constraint_name ?? ''];
      if (rule) return new Refusal('already_exists', rule.message, { errors: rule.field ? [rule] : [] });
      return new Refusal('already_exists', 'This is already there.');
    }
    case '23P01':
      return new Refusal(
        'wrong_state',
        'Somebody recorded a change of owners for the same days at the same time. Look at the parts as they are now and try again.',
      );
    case 'MO001':
    case 'MO002':
      return new Refusal('wrong_state', 'This is locked and can no longer be changed.');
    case 'MO004':
      return new Refusal(
        'period_closed',
        'The accountant has closed the period of this day. Use a later day, or ask for the period to be reopened.',
      );
    case 'MO005':
      return new Refusal('wrong_state', 'The currency is fixed once the ledger has entries.');
    case '40001':
    case '40P01':
      return new Refusal('wrong_state', 'Somebody did the same at the same moment. Try again.');
    default:
      return error;
  }
}
