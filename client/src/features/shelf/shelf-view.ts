import { shelfQuery, type ShelfQuery } from '#common/schemas/lattice';

/** What the shelf shows, as the address holds it. */
export type ShelfView = Omit<ShelfQuery, 'pageSize'>;

export const shelfPageSize = 50;

const defaults: ShelfView = {
  search: '',
  sort: 'updated',
  order: 'desc',
  state: undefined,
  deleted: false,
  page: 1,
};

const names = ['search', 'sort', 'order', 'state', 'deleted', 'page'] as const;

/** Reads the view from an address; a value that makes no sense counts as not given. */
export function readShelfView(params: URLSearchParams): ShelfView {
  const given: Record<string, string> = {};
  for (const name of names) {
    const value = params.get(name);
    if (value !== null && shelfQuery.shape[name].safeParse(value).success) {
      given[name] = value;
    }
  }
  const { pageSize: _, ...view } = shelfQuery.parse(given);
  return { ...view, state: view.state };
}

/** The query part of the address of a view; what is as usual is left out. */
export function writeShelfView(view: ShelfView): string {
  const params = new URLSearchParams();
  for (const name of names) {
    const value = view[name];
    if (value !== undefined && value !== defaults[name]) {
      params.set(name, String(value));
    }
  }
  return params.toString();
}

/** Whether the view leaves lattices out by search or state. */
export function isFiltered(view: ShelfView): boolean {
  return view.search !== '' || view.state !== undefined;
}
