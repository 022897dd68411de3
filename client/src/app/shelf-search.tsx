import { Search } from 'lucide-react';
import { useRef, type FormEvent, type JSX } from 'react';
import { useLocation, useNavigate, useSearchParams } from 'react-router-dom';

import { classNames } from '#client/lib/class-names.ts';
import { useHotkey } from '#client/lib/hotkeys.ts';

interface ShelfSearchProps {
  workspace: string;
  className?: string;
}

/** Search from anywhere: leads to the shelf, with what was typed in the address. */
export function ShelfSearch({ workspace, className }: ShelfSearchProps): JSX.Element {
  const navigate = useNavigate();
  const { pathname } = useLocation();
  const [params] = useSearchParams();
  const field = useRef<HTMLInputElement>(null);
  const shelf = `/w/${workspace}`;
  const shown = pathname === shelf ? (params.get('search') ?? '') : '';

  useHotkey('/', (event) => {
    event.preventDefault();
    field.current?.focus();
    field.current?.select();
  });

  const find = (event: FormEvent): void => {
    event.preventDefault();
    const search = new URLSearchParams(pathname === shelf ? params : undefined);
    search.delete('page');
    search.set('search', field.current?.value.trim() ?? '');
    if (search.get('search') === '') {
      search.delete('search');
    }
    void navigate({ pathname: shelf, search: search.toString() });
  };

  return (
    <form
      role="search"
      aria-label="Lattices"
      onSubmit={find}
      className={classNames('relative', className)}
    >
      <Search
        aria-hidden
        className="pointer-events-none absolute top-2.5 left-3 size-4 text-soft"
      />
      <input
        key={shown}
        ref={field}
        type="search"
        aria-label="Find a lattice or formula"
        aria-keyshortcuts="/"
        placeholder="Find a lattice, formula …"
        defaultValue={shown}
        className="h-9 w-full rounded-control border border-line bg-raised pr-3 pl-9 hover:border-faint"
      />
    </form>
  );
}
