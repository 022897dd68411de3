/** How far a value was verified. `own`: a workspace put it in place of the shipped one. */
export type SourceStatus = 'verified' | 'single-source' | 'computed-here' | 'from-memory' | 'own';

/** A number with where it comes from. The unit stands in the name of what gives it. */
export interface Sourced {
  readonly value: number;
  readonly source: string;
  readonly status: SourceStatus;
}

/** A workspace's own values by key (`mass:Na`, `ionisation:Na:1` …: {@link readDataKey}). */
export type DataOverrides = ReadonlyMap<string, { readonly value: number; readonly note: string }>;

/** Shipped values only. */
export const noOverrides: DataOverrides = new Map();

/** The workspace's own value for a key if it has one, else the shipped one. */
export function ownOr(
  overrides: DataOverrides,
  key: string,
  shipped: Sourced | null,
): Sourced | null {
  const own = overrides.get(key);
  if (own === undefined) {
    return shipped;
  }
  const source = own.note === '' ? 'Own value of this workspace' : own.note;
  return { value: own.value, source, status: 'own' };
}

/** An ion as keys write it: `Na+1`, `O-2`. */
export function ionKey(element: string, chargeE: number): string {
  return `${element}${chargeE < 0 ? '' : '+'}${chargeE}`;
}
