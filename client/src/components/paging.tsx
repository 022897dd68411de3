import { ChevronLeft, ChevronRight } from 'lucide-react';
import type { ComponentProps, JSX } from 'react';
import { Link } from 'react-router-dom';

interface PagingProps {
  page: number;
  pageSize: number;
  total: number;
  /** Address of a page. */
  addressOf: (page: number) => ComponentProps<typeof Link>['to'];
}

const look =
  'inline-grid size-9 place-items-center rounded-control border border-line bg-raised text-ink';

/** Which part of a long list this is, and the way to its neighbours; nothing when all is shown. */
export function Paging({ page, pageSize, total, addressOf }: PagingProps): JSX.Element | null {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1 && page === 1) {
    return null;
  }
  const first = (page - 1) * pageSize + 1;
  const step = (target: number, label: string, sign: JSX.Element): JSX.Element =>
    target < 1 || target > pages ? (
      <span aria-hidden className={`${look} opacity-40`}>
        {sign}
      </span>
    ) : (
      <Link to={addressOf(target)} aria-label={label} className={`${look} hover:border-faint`}>
        {sign}
      </Link>
    );
  return (
    <nav aria-label="Pages" className="flex items-center justify-end gap-2 pt-4">
      <span className="mr-2 text-small text-soft">
        {first}–{Math.min(total, page * pageSize)} of {total}
      </span>
      {step(page - 1, 'Page before', <ChevronLeft aria-hidden className="size-4" />)}
      {step(page + 1, 'Next page', <ChevronRight aria-hidden className="size-4" />)}
    </nav>
  );
}
