'use client';

import { Check, Copy } from 'lucide-react';
import { useState } from 'react';
import { Button } from './button';
import { IconButton } from './icon-button';

/** Copies a text and says so. Without a visible label it is a small square. */
export function CopyButton({
  text,
  label = 'Copy',
  iconOnly = false,
}: {
  text: string;
  label?: string;
  iconOnly?: boolean;
}) {
  const [state, setState] = useState<'idle' | 'copied' | 'failed'>('idle');
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setState('copied');
    } catch {
      setState('failed');
    }
    setTimeout(() => setState('idle'), 2000);
  };
  const icon = state === 'copied' ? <Check aria-hidden /> : <Copy aria-hidden />;
  const said = state === 'copied' ? 'Copied' : state === 'failed' ? 'Could not copy' : label;
  return (
    <>
      {iconOnly ? (
        <IconButton label={said} onClick={copy}>
          {icon}
        </IconButton>
      ) : (
        <Button size="sm" icon={icon} onClick={copy}>
          {said}
        </Button>
      )}
      <span role="status" className="sr-only">
        {state === 'idle' ? '' : said}
      </span>
    </>
  );
}
