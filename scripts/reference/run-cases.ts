import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { CaseKind, Finding, ReferenceCase } from './case-kind';
import { geneticsCaseKinds } from './genetics-cases';
import { lineageCaseKinds } from './lineage-cases';

export interface CaseOutcome {
  id: string;
  ok: boolean;
  findings: readonly Finding[];
  /** Why the case was refused or could not be answered. */
  message: string | null;
}

/** Every kind of case that can be answered; the money's kinds join where their file is there. */
export async function loadCaseKinds(): Promise<Readonly<Record<string, CaseKind>>> {
  const money = new URL('./money-cases.ts', import.meta.url);
  if (!existsSync(fileURLToPath(money))) return { ...geneticsCaseKinds, ...lineageCaseKinds };
  const { moneyCaseKinds } = (await import(money.href)) as { moneyCaseKinds: Record<string, CaseKind> };
  return { ...geneticsCaseKinds, ...lineageCaseKinds, ...moneyCaseKinds };
}

/** Answers a case and compares; an unknown kind, a refusal that was not asked for and a missing answer are failures. */
export function runCase(kinds: Readonly<Record<string, CaseKind>>, given: ReferenceCase): CaseOutcome {
  const { id } = given;
  const kind = Object.hasOwn(kinds, given.kind) ? kinds[given.kind] : undefined;
  if (!kind) return { id, ok: false, findings: [], message: `unknown kind "${given.kind}"` };
  let findings: Finding[];
  try {
    findings = kind(given.input, given.expected ?? {});
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    return { id, ok: given.error === true, findings: [], message: `refused: ${message}` };
  }
  if (given.error === true) return { id, ok: false, findings, message: 'was not refused' };
  if (findings.length === 0) return { id, ok: false, findings, message: 'nothing to compare' };
  return { id, ok: findings.every(({ ok }) => ok), findings, message: null };
}
