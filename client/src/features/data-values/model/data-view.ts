import { dataKinds, type DataKind } from '#common/chemistry/data-key';

/** What of the tables is shown. */
export interface DataView {
  readonly search: string;
  readonly kind: DataKind | 'all';
  readonly isOwnOnly: boolean;
  readonly page: number;
}

/** The view an address asks for; what it says wrongly is left at the usual. */
export function readDataView(params: URLSearchParams): DataView {
  const page = Number(params.get('page') ?? '1');
  return {
    search: params.get('search') ?? '',
    kind: dataKinds.find(({ kind }) => kind === params.get('kind'))?.kind ?? 'all',
    isOwnOnly: params.get('show') === 'ours',
    page: Number.isInteger(page) && page >= 1 ? page : 1,
  };
}

/** The address of a view; the usual is left out. */
export function writeDataView({ search, kind, isOwnOnly, page }: DataView): URLSearchParams {
  const params = new URLSearchParams();
  if (search !== '') {
    params.set('search', search);
  }
  if (kind !== 'all') {
    params.set('kind', kind);
  }
  if (isOwnOnly) {
    params.set('show', 'ours');
  }
  if (page !== 1) {
    params.set('page', String(page));
  }
  return params;
}
