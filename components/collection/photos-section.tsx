'use client';

import { ImagePlus, Star, Trash2 } from 'lucide-react';
import Image from 'next/image';
import { useRef, useState } from 'react';
import { toast } from 'sonner';
import { sayDay } from '@/components/drawings/season-days';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { useAddPhoto, useEditPhoto, useFileAddresses, useRemovePhoto } from '@/lib/client/collection';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { AnimalRecord } from '@/lib/contracts/animal-record';

/** Photos of an animal: one large, the others to choose from. */
export function PhotosSection({ animal }: { animal: AnimalRecord }) {
  const { slug } = useWorkspace();
  const mayEdit = useMay('animal.edit');
  const files = useFileAddresses();
  const add = useAddPhoto();
  const edit = useEditPhoto();
  const remove = useRemovePhoto();
  const chooser = useRef<HTMLInputElement>(null);
  const [chosen, setChosen] = useState<string | null>(null);
  const [asks, setAsks] = useState(false);
  const photo = animal.photos.find(({ id }) => id === chosen) ?? animal.photos[0];

  const upload = async (list: FileList | null) => {
    for (const file of list ?? []) {
      await add
        .mutateAsync({ params: { workspace: slug, animal: animal.id }, body: { file } })
        .catch((error: Error) => toast.error(`${file.name}: ${error.message}`));
    }
  };

  return (
    <section aria-label="Photos" className="flex flex-col gap-2">
      {photo ? (
        <figure>
          <Image
            unoptimized
            src={files.photo(photo.id, 'large')}
            width={photo.width}
            height={photo.height}
            alt={photo.caption || `${animal.code}, ${animal.description}`}
            className="max-h-72 w-full rounded-lg bg-track object-cover"
          />
          {photo.caption || photo.takenOn ? (
            <figcaption className="mt-1 text-sm text-ink-3">
              {[photo.caption, photo.takenOn ? sayDay(photo.takenOn) : ''].filter(Boolean).join(' · ')}
            </figcaption>
          ) : null}
        </figure>
      ) : null}
      {animal.photos.length > 1 ? (
        <ul className="flex flex-wrap gap-1.5">
          {animal.photos.map((one, index) => (
            <li key={one.id}>
              <button
                type="button"
                aria-label={`Photo ${index + 1} of ${animal.photos.length}`}
                aria-pressed={one.id === photo?.id}
                onClick={() => setChosen(one.id)}
                className="size-12 overflow-hidden rounded-md border-2 border-transparent aria-pressed:border-ember"
              >
                <Image
                  unoptimized
                  src={files.photo(one.id, 'small')}
                  width={96}
                  height={96}
                  alt=""
                  className="size-full object-cover"
                />
              </button>
            </li>
          ))}
        </ul>
      ) : null}
      {mayEdit ? (
        <div className="flex flex-wrap gap-2">
          <input
            ref={chooser}
            type="file"
            accept="image/jpeg,image/png,image/webp,image/gif"
            multiple
            className="sr-only"
            tabIndex={-1}
            aria-label="Choose photos"
            onChange={(event) => {
              void upload(event.target.files).finally(() => {
                if (chooser.current) chooser.current.value = '';
              });
            }}
          />
          <Button
            size="sm"
            busy={add.isPending}
            icon={<ImagePlus aria-hidden />}
            onClick={() => chooser.current?.click()}
          >
            {animal.photos.length ? 'Add photos' : 'Add the first photo'}
          </Button>
          {photo ? (
            <>
              {photo.id !== animal.photos[0]?.id ? (
                <Button
                  size="sm"
                  tone="plain"
                  busy={edit.isPending}
                  icon={<Star aria-hidden />}
                  onClick={() =>
                    edit.mutate({ params: { workspace: slug, photo: photo.id }, body: { first: true } })
                  }
                >
                  Show first
                </Button>
              ) : null}
              <ConfirmDialog
                open={asks}
                onOpenChange={setAsks}
                trigger={
                  <Button size="sm" tone="plain" icon={<Trash2 aria-hidden />}>
                    Remove
                  </Button>
                }
                title="Remove this photo?"
                description="It is deleted for everyone and can't be brought back."
                confirmLabel="Remove"
                busy={remove.isPending}
                onConfirm={() =>
                  remove.mutate(
                    { params: { workspace: slug, photo: photo.id } },
                    {
                      onSuccess: () => setAsks(false),
                      onError: (error) => toast.error(error.problem.detail),
                    },
                  )
                }
              />
            </>
          ) : null}
        </div>
      ) : null}
    </section>
  );
}
