'use client';

import { Upload } from 'lucide-react';
import { useId, useState, type ReactNode } from 'react';
import { classNames } from './class-names';

/** A place to drop files on, and a button to choose them. What is done with them is for the form to say. */
export function FileDrop({
  label,
  hint,
  accept,
  multiple = false,
  disabled = false,
  error,
  onFiles,
}: {
  label: ReactNode;
  hint?: ReactNode;
  /** As of `<input accept>`; it filters the chooser, the server checks. */
  accept?: string;
  multiple?: boolean;
  disabled?: boolean;
  error?: ReactNode;
  onFiles: (files: File[]) => void;
}) {
  const id = useId();
  const [over, setOver] = useState(false);
  return (
    <div className="flex flex-col gap-1">
      <label
        htmlFor={id}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={(event) => {
          event.preventDefault();
          setOver(false);
          const files = [...event.dataTransfer.files];
          if (!disabled && files.length > 0) onFiles(multiple ? files : files.slice(0, 1));
        }}
        className={classNames(
          'flex flex-col items-center gap-1 rounded-lg border border-dashed px-4 py-6 text-center text-base',
          'has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-focus',
          over ? 'border-ember bg-chosen' : 'border-edge bg-card hover:bg-hover',
          disabled && 'pointer-events-none opacity-55',
        )}
      >
        <Upload aria-hidden className="size-5 text-ink-3" />
        <span className="font-semibold">{label}</span>
        {hint ? <span className="text-sm text-ink-3">{hint}</span> : null}
        <input
          id={id}
          type="file"
          accept={accept}
          multiple={multiple}
          disabled={disabled}
          aria-describedby={error ? `${id}-error` : undefined}
          className="sr-only"
          onChange={(event) => {
            const files = [...(event.target.files ?? [])];
            // The same file may be chosen again after a correction.
            event.target.value = '';
            if (files.length > 0) onFiles(files);
          }}
        />
      </label>
      {error ? (
        <p id={`${id}-error`} role="alert" className="text-sm font-medium text-alarm">
          {error}
        </p>
      ) : null}
    </div>
  );
}
