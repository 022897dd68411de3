const storageKey = 'holdfast.last-workspace';

/** Slug of the workspace this person saw last on this device, null when unknown. */
export function readLastWorkspace(): string | null {
  try {
    return localStorage.getItem(storageKey);
  } catch {
    // Storage may be blocked; the first workspace is then taken.
    return null;
  }
}

/** Remembers where `/` should lead. */
export function rememberWorkspace(slug: string): void {
  try {
    localStorage.setItem(storageKey, slug);
  } catch {
    // Only a convenience: without storage `/` leads to the first workspace.
  }
}
