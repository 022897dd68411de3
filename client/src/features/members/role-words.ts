import { role, type Role } from '#common/schemas/auth';

/** What each role may do, in one line. */
const hints: Record<Role, string> = {
  owner: 'Everything, members and settings too',
  crystallographer: 'Defines cells, computes, submits, shares',
  reviewer: 'Reads all, remarks, accepts or returns',
  reader: 'Reads all; remarks where the workspace allows it',
};

const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1);

/** The roles as a list to choose from. */
export const roleOptions = role.options.map((value) => ({
  value,
  label: capital(value),
  hint: hints[value],
}));

export const roleWord = capital;
