/** Stem of every query about one workspace. */
export const workspaceKey = (workspace: string) => ['workspaces', workspace] as const;

/** Stem of every query about a workspace's lattices: invalidate it when one of them changes. */
export const latticesKey = (workspace: string) => [...workspaceKey(workspace), 'lattices'] as const;
