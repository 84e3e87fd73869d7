/** `npm run reference -- FILE.json…`: compares the product's core with worked cases from elsewhere. */
import { readFileSync } from 'node:fs';
import type { ReferenceCase } from './reference/case-kind';
import { loadCaseKinds, runCase } from './reference/run-cases';

async function main(files: readonly string[]): Promise<number> {
  if (files.length === 0) {
    console.error('Name one or more case files: npm run reference -- FILE.json…');
    return 1;
  }
  const kinds = await loadCaseKinds();
  let right = 0;
  let wrong = 0;
  for (const file of files) {
    const { cases } = JSON.parse(readFileSync(file, 'utf8')) as { cases: ReferenceCase[] };
    for (const given of cases) {
      const outcome = runCase(kinds, given);
      if (outcome.ok) right += 1;
      else wrong += 1;
      console.log(
        `${outcome.ok ? 'ok   ' : 'WRONG'} ${outcome.id}${outcome.message ? ` (${outcome.message})` : ''}`,
      );
      for (const { what, expected, actual, difference, ok } of outcome.findings) {
        console.log(
          `  ${ok ? '   ' : '!! '}${what}: expected ${expected}, actual ${actual}${difference ? `, difference ${difference}` : ''}`,
        );
      }
    }
  }
  console.log(`${right} ok, ${wrong} wrong`);
  return wrong > 0 || right === 0 ? 1 : 0;
}

main(process.argv.slice(2)).then(
  (code) => {
    process.exitCode = code;
  },
  (error: unknown) => {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  },
);
