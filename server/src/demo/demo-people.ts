import type { Role } from '#common/schemas/auth';

/** One password for all of the demo's people; it stands on the sign-in page. */
export const demoPassword = 'clinker saltglaze bungalow';

export const demoWorkspaceName = 'Kiln Lane';

export type DemoPersonKey = 'runa' | 'teodor' | 'imke' | 'sabela' | 'osric';

export interface DemoPerson {
  readonly key: DemoPersonKey;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
}

/** Invented people of an invented group. */
export const demoPeople: readonly DemoPerson[] = [
  { key: 'runa', name: 'Runa Halvard', email: 'runa@kiln-lane.example', role: 'owner' },
  {
    key: 'teodor',
    name: 'Teodor Brandl',
    email: 'teodor@kiln-lane.example',
    role: 'crystallographer',
  },
  { key: 'imke', name: 'Imke Oduya', email: 'imke@kiln-lane.example', role: 'crystallographer' },
  { key: 'sabela', name: 'Sabela Carrow', email: 'sabela@kiln-lane.example', role: 'reviewer' },
  { key: 'osric', name: 'Osric Pell', email: 'osric@kiln-lane.example', role: 'reader' },
];
