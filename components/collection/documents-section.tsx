'use client';

import { FileText, FileUp, Trash2 } from 'lucide-react';
import { useRef, useState } from 'react';
import { toast } from 'sonner';
import { sayDay } from '@/components/drawings/season-days';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { IconButton } from '@/components/ui/icon-button';
import { useAddDocument, useFileAddresses, useRemoveDocument } from '@/lib/client/collection';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { AnimalRecord } from '@/lib/contracts/animal-record';
import { sayBytes } from './words';

/** Papers that are kept with an animal. */
export function DocumentsSection({ animal }: { animal: AnimalRecord }) {
  const { slug } = useWorkspace();
  const mayEdit = useMay('animal.edit');
  const files = useFileAddresses();
  const add = useAddDocument();
  const remove = useRemoveDocument();
  const chooser = useRef<HTMLInputElement>(null);
  const [asksFor, setAsksFor] = useState<string | null>(null);
  return (
    <section>
      <div className="mb-1 flex items-baseline justify-between gap-3">
        <h3 className="text-lg">Papers</h3>
        {mayEdit ? (
          <>
            <input
              ref={chooser}
              type="file"
              accept=".pdf,.jpg,.jpeg,.png,.txt"
              className="sr-only"
              tabIndex={-1}
              aria-label="Choose a paper"
              onChange={(event) => {
                const file = event.target.files?.[0];
                event.target.value = '';
                if (file) {
                  add.mutate(
                    { params: { workspace: slug, animal: animal.id }, body: { file } },
                    {
                      onSuccess: () => toast.success(`${file.name} is kept`),
                      onError: (error) => toast.error(error.problem.detail),
                    },
                  );
                }
              }}
            />
            <Button
              size="sm"
              tone="link"
              busy={add.isPending}
              icon={<FileUp aria-hidden />}
              onClick={() => chooser.current?.click()}
            >
              Add a paper
            </Button>
          </>
        ) : null}
      </div>
      {animal.documents.length === 0 ? (
        <p className="text-base text-ink-3">None. PDF, JPEG, PNG and plain text are taken, up to 10 MB.</p>
      ) : null}
      <ul>
        {animal.documents.map((document) => (
          <li
            key={document.id}
            className="flex items-center gap-2 border-b border-rule-2 py-1 last:border-b-0"
          >
            <FileText aria-hidden className="size-4 shrink-0 text-ink-3" />
            <a
              href={files.document(document.id)}
              className="min-w-0 flex-1 truncate text-slate underline underline-offset-2"
            >
              {document.name}
            </a>
            <span className="text-sm whitespace-nowrap text-ink-3">
              {sayBytes(document.bytes)} · {sayDay(document.createdAt)}
            </span>
            {mayEdit ? (
              <ConfirmDialog
                open={asksFor === document.id}
                onOpenChange={(open) => setAsksFor(open ? document.id : null)}
                trigger={
                  <IconButton label={`Remove ${document.name}`} className="size-8">
                    <Trash2 aria-hidden className="!size-4" />
                  </IconButton>
                }
                title={`Remove ${document.name}?`}
                description="It is deleted for everyone and can't be brought back."
                confirmLabel="Remove"
                busy={remove.isPending}
                onConfirm={() =>
                  remove.mutate(
                    { params: { workspace: slug, document: document.id } },
                    {
                      onSuccess: () => setAsksFor(null),
                      onError: (error) => toast.error(error.problem.detail),
                    },
                  )
                }
              />
            ) : null}
          </li>
        ))}
      </ul>
    </section>
  );
}
