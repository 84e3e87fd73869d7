import { Notice } from '@/components/ui/notice';

/** Where people agree on money and animals: what this is not. */
export function TermsCaution() {
  return (
    <Notice tone="straw">
      Not legal advice. The product keeps what you agree and splits by it; whether it binds, and how it is
      taxed, a lawyer and an accountant can tell you.
    </Notice>
  );
}
