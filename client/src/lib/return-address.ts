/** Address of the sign-in page that comes back to a place afterwards. */
export function signInAddress(path: string, reason?: 'expired'): string {
  const search = new URLSearchParams();
  if (path !== '/') {
    search.set('to', path);
  }
  if (reason !== undefined) {
    search.set('reason', reason);
  }
  const tail = search.toString();
  return tail === '' ? '/sign-in' : `/sign-in?${tail}`;
}

/** Where to go after signing in; only ever a path of this site. */
export function readReturnAddress(search: URLSearchParams): string {
  const to = search.get('to') ?? '/';
  const isOwnPath = to.startsWith('/') && !/^\/[/\\]/.test(to) && !to.startsWith('/sign-in');
  return isOwnPath ? to : '/';
}
