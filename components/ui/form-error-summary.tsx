'use client';

import { useEffect, useRef, type ReactNode } from 'react';

/** What kept a form from being saved. Takes the focus when it appears, so that nobody has to look for it. */
export function FormErrorSummary({
  title = 'This was not saved',
  message,
  errors = [],
}: {
  title?: ReactNode;
  /** What happened and what is safe, e.g. "The server could not be reached. What you typed is still here." */
  message?: ReactNode;
  errors?: readonly { message: string; /** Id of the control, for a link to it. */ fieldId?: string }[];
}) {
  const box = useRef<HTMLDivElement>(null);
  const shown = Boolean(message) || errors.length > 0;
  useEffect(() => {
    if (shown) box.current?.focus();
  }, [shown]);
  if (!shown) return null;
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="alert"
      className="rounded-lg border border-alarm bg-alarm-tint px-4 py-3 text-base text-alarm-deep"
    >
      <p className="font-semibold">{title}</p>
      {message ? <p className="mt-0.5">{message}</p> : null}
      {errors.length > 0 ? (
        <ul className="mt-1 list-disc space-y-0.5 pl-5">
          {errors.map((error) => (
            <li key={`${error.fieldId}${error.message}`}>
              {error.fieldId ? (
                <a href={`#${error.fieldId}`} className="underline underline-offset-2">
                  {error.message}
                </a>
              ) : (
                error.message
              )}
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  );
}
