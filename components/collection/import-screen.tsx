'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { toast } from 'sonner';
import { PageBody } from '@/components/shell/page-body';
import { PageHeader } from '@/components/shell/page-header';
import { Badge } from '@/components/ui/badge';
import { Button } from '@/components/ui/button';
import { FileDrop } from '@/components/ui/file-drop';
import { FormErrorSummary } from '@/components/ui/form-error-summary';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { PlainTable } from '@/components/ui/plain-table';
import { Segmented } from '@/components/ui/segmented';
import { Select } from '@/components/ui/select';
import { useImportAnimals, usePreviewImport } from '@/lib/client/collection';
import { useWorkspace } from '@/lib/client/workspace';
import { importFields, type ImportField, type ImportPreview } from '@/lib/contracts/animal-import';

const MOST_BYTES = 5_000_000;
const FIRST_ROWS = 100;

interface ChosenFile {
  name: string;
  csv: string;
}

/** Import of a collection: choose a file, say what its columns are, look at every row, then all of it or nothing. */
export function ImportScreen() {
  const { slug } = useWorkspace();
  const router = useRouter();
  const preview = usePreviewImport();
  const commit = useImportAnimals();
  const [file, setFile] = useState<ChosenFile | null>(null);
  const [fileError, setFileError] = useState<string | null>(null);
  const [plan, setPlan] = useState<ImportPreview | null>(null);
  const [columns, setColumns] = useState<(ImportField | null)[]>([]);

  const look = (chosen: ChosenFile, as?: (ImportField | null)[]) => {
    commit.reset();
    preview.mutate(
      { params: { workspace: slug }, body: { csv: chosen.csv, columns: as } },
      {
        onSuccess: (answer) => {
          setPlan(answer);
          setColumns(answer.columns);
        },
      },
    );
  };

  const choose = async ([chosen]: File[]) => {
    if (!chosen) return;
    if (chosen.size > MOST_BYTES) {
      setFileError('This file is larger than 5 MB.');
      return;
    }
    setFileError(null);
    setPlan(null);
    const next = { name: chosen.name, csv: await chosen.text() };
    setFile(next);
    look(next);
  };

  const setColumn = (index: number, field: ImportField | null) => {
    const next = columns.map((one, at) =>
      at === index ? field : field !== null && one === field ? null : one,
    );
    setColumns(next);
    if (file && next.includes('code')) look(file, next);
  };

  const importAll = () => {
    if (!file || commit.isPending) return;
    commit.mutate(
      { params: { workspace: slug }, body: { csv: file.csv, columns } },
      {
        onSuccess: ({ imported }) => {
          toast.success(`${imported} animals imported`);
          router.push(`/${slug}/collection`);
        },
      },
    );
  };

  const error = commit.error ?? preview.error;
  return (
    <>
      <PageHeader
        title="Import from CSV"
        back={{ href: `/${slug}/collection`, label: 'Collection' }}
        actions={
          plan ? (
            <Button
              tone="primary"
              busy={commit.isPending}
              disabled={plan.errors > 0 || preview.isPending || !columns.includes('code')}
              onClick={importAll}
            >
              Import {plan.rows.length} {plan.rows.length === 1 ? 'animal' : 'animals'}
            </Button>
          ) : null
        }
      />
      <PageBody className="max-w-6xl">
        <FormErrorSummary
          title={commit.error ? 'Nothing was imported' : 'The file could not be read so'}
          message={error?.problem.detail}
        />
        <FileDrop
          label={file ? `${file.name}: choose another file` : 'Drop a CSV file here, or choose one'}
          hint="One row per animal, with a head. A file that was exported here fits as it is. Parents may stand in the same file, in any order."
          accept=".csv,text/csv"
          disabled={commit.isPending}
          error={fileError}
          onFiles={(files) => void choose(files)}
        />
        {plan ? (
          <>
            <Panel
              title="Columns"
              aside="What each column of the file is. Columns that are left out are not read."
            >
              <div className="grid gap-3 sm:grid-cols-2 lg:grid-cols-3">
                {plan.head.map((head, index) => (
                  <label key={`${head}-${index}`} className="flex min-w-0 flex-col gap-1">
                    <span className="text-sm font-semibold break-words">{head || `Column ${index + 1}`}</span>
                    <Select
                      value={columns[index] ?? ''}
                      onChange={(event) =>
                        setColumn(index, (event.target.value || null) as ImportField | null)
                      }
                      options={[
                        { value: '', label: 'leave out' },
                        ...importFields.map((field) => ({ value: field, label: field })),
                      ]}
                    />
                    <span className="truncate text-sm text-ink-3">
                      {plan.samples[index]?.join(' · ') || 'empty'}
                    </span>
                  </label>
                ))}
              </div>
            </Panel>
            <PreviewRows plan={plan} />
          </>
        ) : null}
      </PageBody>
    </>
  );
}

function PreviewRows({ plan }: { plan: ImportPreview }) {
  const wrong = plan.rows.filter(({ errors }) => errors.length > 0);
  const [filter, setFilter] = useState<'all' | 'wrong'>('all');
  const shows = filter === 'wrong' && wrong.length ? wrong : plan.rows;
  return (
    <Panel title="Rows" aside={`${plan.rows.length} rows, ${wrong.length} with something to put right`}>
      {wrong.length ? (
        <Notice tone="straw" className="mb-3">
          Put the rows right in the file and choose it again. Nothing is imported until every row fits: all of
          it, or nothing.
        </Notice>
      ) : (
        <Notice tone="moss" className="mb-3">
          Every row fits. Nothing has been saved yet.
        </Notice>
      )}
      {wrong.length ? (
        <Segmented
          label="Rows to show"
          className="mb-3"
          value={filter}
          onChange={setFilter}
          options={[
            { value: 'all', label: 'All rows' },
            { value: 'wrong', label: `Only these ${wrong.length}` },
          ]}
        />
      ) : null}
      <PlainTable
        label="Rows of the file"
        rows={shows.slice(0, FIRST_ROWS)}
        rowKey={(row) => String(row.line)}
        columns={[
          { id: 'line', header: 'Row', mono: true, cell: (row) => row.line },
          { id: 'code', header: 'Code', mono: true, cell: (row) => row.code || '–' },
          { id: 'summary', header: 'Becomes', cell: (row) => row.summary },
          {
            id: 'errors',
            header: 'To put right',
            cell: (row) =>
              row.errors.length ? (
                <ul className="flex flex-col gap-1">
                  {row.errors.map((error) => (
                    <li key={error.field + error.message}>
                      <span className="font-semibold text-alarm">{error.field}:</span> {error.message}
                    </li>
                  ))}
                </ul>
              ) : (
                <Badge tone="moss">fits</Badge>
              ),
          },
        ]}
      />
      {shows.length > FIRST_ROWS ? (
        <p className="mt-2 text-sm text-ink-3">
          The first {FIRST_ROWS} of {shows.length} rows; all of them were checked.
        </p>
      ) : null}
    </Panel>
  );
}
