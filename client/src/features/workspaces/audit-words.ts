const words: Partial<Record<string, string>> = {
  'auth.sign_in': 'signed in',
  'auth.sign_in_failed': 'was refused at sign-in',
  'auth.sign_out': 'signed out',
  'auth.change_password': 'changed their password',
  'workspace.create': 'made the workspace',
  'workspace.update': 'changed the settings',
  'workspace.leave': 'left the workspace',
  'member.join': 'joined',
  'member.change_role': 'changed the role of',
  'member.remove': 'removed',
  'member.leave': 'left the workspace',
  'invitation.create': 'invited',
  'invitation.accept': 'accepted the invitation',
  'invitation.withdraw': 'withdrew the invitation of',
  'lattice.create': 'made the lattice',
  'lattice.update': 'renamed or tagged',
  'lattice.delete': 'deleted',
  'lattice.restore': 'restored',
  'draft.discard': 'discarded the draft of',
  'revision.save': 'saved a revision of',
  'revision.submit': 'submitted for review',
  'revision.withdraw': 'withdrew from review',
  'revision.accept': 'accepted',
  'revision.return': 'returned',
  'annotation.create': 'remarked on',
  'annotation.reply': 'replied on',
  'annotation.resolve': 'resolved a remark on',
  'annotation.reopen': 'reopened a remark on',
  'share.create': 'shared',
  'share.revoke': 'withdrew a link to',
  'data.override': 'set the workspace’s own value of',
  'data.restore': 'went back to the shipped value of',
};

/** A recorded action as part of a sentence: `lattice.delete` → `deleted`. */
export function actionWords(action: string): string {
  return words[action] ?? action.replaceAll(/[._]/g, ' ');
}
