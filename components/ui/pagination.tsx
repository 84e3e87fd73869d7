'use client';

import { ChevronLeft, ChevronRight } from 'lucide-react';
import { Button } from './button';

/** Pages of a list, counted from 1: "41–60 of 318". */
export function Pagination({
  page,
  pageSize,
  total,
  onPageChange,
  label = 'Pages',
}: {
  page: number;
  pageSize: number;
  total: number;
  onPageChange: (page: number) => void;
  label?: string;
}) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  const from = total === 0 ? 0 : (page - 1) * pageSize + 1;
  const to = Math.min(total, page * pageSize);
  return (
    <nav aria-label={label} className="flex items-center justify-between gap-3">
      <p className="text-sm text-ink-2" aria-live="polite">
        <span className="font-mono">
          {from}–{to}
        </span>{' '}
        of <span className="font-mono">{total}</span>
      </p>
      <div className="flex gap-2">
        <Button
          size="sm"
          disabled={page <= 1}
          onClick={() => onPageChange(page - 1)}
          icon={<ChevronLeft aria-hidden />}
        >
          Previous
        </Button>
        <Button size="sm" disabled={page >= pages} onClick={() => onPageChange(page + 1)}>
          Next
          <ChevronRight aria-hidden />
        </Button>
      </div>
    </nav>
  );
}
