import type { Role } from '#common/schemas/auth';
import type { RevisionState } from '#common/schemas/lattice';

/** Everything a member may want to do in a workspace. */
export const workspaceActions = [
  'workspace.read',
  'workspace.update',
  'workspace.leave',
  'member.list',
  'member.change_role',
  'member.remove',
  'invitation.list',
  'invitation.create',
  'invitation.withdraw',
  'audit.read',
  'lattice.read',
  'lattice.create',
  'lattice.update',
  'lattice.delete',
  'lattice.restore',
  'draft.edit',
  'evaluation.run',
  'revision.save',
  'revision.submit',
  'revision.withdraw',
  'revision.accept',
  'revision.return',
  'annotation.create',
  'annotation.reply',
  'annotation.resolve',
  'share.list',
  'share.create',
  'share.revoke',
  'data.override',
] as const;
export type WorkspaceAction = (typeof workspaceActions)[number];

/** Who asks: a member, with their role there and the settings that bear on it. */
export interface WorkspaceActor {
  readonly userId: string;
  readonly role: Role;
  readonly readersMayComment: boolean;
  readonly requiresSecondPerson: boolean;
}

/** What it is about, as far as the decision needs it. */
export interface PolicySubject {
  /** Author of the revision or remark. */
  readonly authorId?: string;
  /** Who submitted the revision. */
  readonly submittedById?: string | null;
  readonly state?: RevisionState;
}

const reading: readonly WorkspaceAction[] = [
  'workspace.read',
  'workspace.leave',
  'member.list',
  'lattice.read',
];
const commenting: readonly WorkspaceAction[] = ['annotation.create', 'annotation.reply'];

const actionsByRole: Readonly<Record<Role, ReadonlySet<WorkspaceAction>>> = {
  owner: new Set(workspaceActions),
  crystallographer: new Set<WorkspaceAction>([
    ...reading,
    ...commenting,
    'lattice.create',
    'lattice.update',
    'lattice.delete',
    'lattice.restore',
    'draft.edit',
    'evaluation.run',
    'revision.save',
    'revision.submit',
    'revision.withdraw',
    'annotation.resolve',
    'share.list',
    'share.create',
    'share.revoke',
    'data.override',
  ]),
  reviewer: new Set<WorkspaceAction>([
    ...reading,
    ...commenting,
    'evaluation.run',
    'annotation.resolve',
    'revision.accept',
    'revision.return',
    'share.list',
  ]),
  reader: new Set<WorkspaceAction>(reading),
};

/**
 * Whether a member may do something: the one decision the server enforces and the client hides
 * controls with. Says nothing about state (a revision in the wrong state is another failure).
 */
export function can(
  actor: WorkspaceActor | null,
  action: WorkspaceAction,
  subject: PolicySubject = {},
): boolean {
  if (actor === null) {
    return false;
  }
  if (commenting.includes(action) && actor.role === 'reader') {
    return actor.readersMayComment;
  }
  if (!actionsByRole[actor.role].has(action)) {
    return false;
  }
  if (action === 'annotation.resolve' && actor.role === 'crystallographer') {
    return subject.authorId === undefined || subject.authorId === actor.userId;
  }
  if (action === 'revision.accept' && actor.requiresSecondPerson) {
    return subject.authorId !== actor.userId && subject.submittedById !== actor.userId;
  }
  return true;
}
