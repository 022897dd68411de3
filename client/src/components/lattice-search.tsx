import { Search } from 'lucide-react';
import { useEffect, useRef, useState, type FormEvent, type JSX } from 'react';
import { useLocation, useNavigate, useSearchParams } from 'react-router-dom';

import { classNames } from '#client/lib/class-names.ts';
import { useHotkey } from '#client/lib/hotkeys.ts';

interface LatticeSearchProps {
  workspace: string;
  className?: string;
}

const pauseMs = 250;

/** What is typed, kept in step with the address: `shown` wins when the address changes by itself. */
function useTyped(shown: string): [string, (text: string) => void] {
  const [typed, setTyped] = useState(shown);
  const [known, setKnown] = useState(shown);
  if (known !== shown) {
    setKnown(shown);
    if (typed.trim() !== shown) {
      setTyped(shown);
    }
  }
  return [typed, setTyped];
}

/** Search of the workspace's shelf: filters as one types there, leads there from anywhere else. */
export function LatticeSearch({ workspace, className }: LatticeSearchProps): JSX.Element {
  const navigate = useNavigate();
  const { pathname, hash } = useLocation();
  const [params] = useSearchParams();
  const field = useRef<HTMLInputElement>(null);
  const shelf = `/w/${workspace}`;
  const isShelf = pathname === shelf;
  const shown = isShelf ? (params.get('search') ?? '') : '';
  const [typed, setTyped] = useTyped(shown);

  const find = (replace: boolean): void => {
    const search = new URLSearchParams(isShelf ? params : undefined);
    search.delete('page');
    search.delete('search');
    if (typed.trim() !== '') {
      search.set('search', typed.trim());
    }
    void navigate({ pathname: shelf, search: search.toString() }, { replace });
  };
  const latestFind = useRef(find);
  useEffect(() => {
    latestFind.current = find;
  });
  useEffect(() => {
    if (!isShelf || typed.trim() === shown) {
      return undefined;
    }
    const timer = setTimeout(() => latestFind.current(true), pauseMs);
    return () => clearTimeout(timer);
  }, [typed, shown, isShelf]);
  useEffect(() => {
    if (hash === '#search') {
      field.current?.focus();
    }
  }, [hash]);
  useHotkey('/', (event) => {
    event.preventDefault();
    field.current?.focus();
    field.current?.select();
  });

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    find(false);
  };
  return (
    <form
      role="search"
      aria-label="Lattices"
      onSubmit={submit}
      className={classNames('relative', className)}
    >
      <Search
        aria-hidden
        className="pointer-events-none absolute top-2.5 left-3 size-4 text-soft"
      />
      <input
        ref={field}
        type="search"
        aria-label="Find a lattice or formula"
        aria-keyshortcuts="/"
        placeholder="Find a lattice, formula …"
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
        className="h-9 w-full rounded-control border border-line bg-raised pr-3 pl-9 hover:border-faint"
      />
    </form>
  );
}
