import type { CurrentUser, MembershipSummary, Role, SessionState } from '#common/schemas/auth';
import type { LatticeSummary, ShelfPage } from '#common/schemas/lattice';
import type { Member } from '#common/schemas/workspace';

/** A UUIDv7 that tells tests apart. */
export const idOf = (number: number): string =>
  `018f0000-0000-7000-8000-${String(number).padStart(12, '0')}`;

export const membershipOf = (change: Partial<MembershipSummary> = {}): MembershipSummary => ({
  workspaceId: idOf(90),
  workspaceSlug: 'kiln-lane',
  workspaceName: 'Kiln Lane',
  role: 'owner',
  readersMayComment: true,
  requiresSecondPerson: true,
  ...change,
});

export const userOf = (role: Role = 'owner', change: Partial<CurrentUser> = {}): CurrentUser => ({
  id: idOf(1),
  name: 'Oda Rehn',
  initials: 'OR',
  email: 'oda.rehn@kilnlane.example',
  memberships: [membershipOf({ role })],
  ...change,
});

export const sessionOf = (change: Partial<SessionState> = {}): SessionState => ({
  user: null,
  needsSetup: false,
  demo: null,
  ...change,
});

export const latticeOf = (change: Partial<LatticeSummary> = {}): LatticeSummary => ({
  id: idOf(100),
  name: 'Periclase, trial 3',
  tags: [],
  formula: 'MgO',
  prototype: 'rock-salt',
  spaceGroupSymbol: 'F m -3 m',
  spaceGroupNumber: 225,
  madelungReduced: { value: 1.74756459463318, bound: 4e-12 },
  energyEvPerFormulaUnit: { value: -47.7954617216, bound: 4e-10 },
  problemCode: null,
  state: 'in_review',
  headRevision: 4,
  hasDraft: false,
  openRemarks: 0,
  author: { id: idOf(1), name: 'Oda Rehn', initials: 'OR' },
  createdAt: '2026-11-01T08:00:00Z',
  updatedAt: '2026-11-30T08:00:00Z',
  deletedAt: null,
  ...change,
});

export const shelfOf = (items: LatticeSummary[], change: Partial<ShelfPage> = {}): ShelfPage => ({
  items,
  page: 1,
  pageSize: 50,
  total: items.length,
  ...change,
});

export const memberOf = (change: Partial<Member> = {}): Member => ({
  userId: idOf(1),
  name: 'Oda Rehn',
  initials: 'OR',
  email: 'oda.rehn@kilnlane.example',
  role: 'owner',
  joinedAt: '2026-10-01T08:00:00Z',
  ...change,
});
