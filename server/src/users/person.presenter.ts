import type { PersonSummary } from '#common/schemas/shared';

const letterOrDigit = /[\p{L}\p{N}]/u;

/** One or two letters for the round badge: first and last word of the name. */
export function initialsOf(name: string): string {
  const words = name
    .split(/\s+/)
    .map((word) => letterOrDigit.exec(word)?.[0])
    .filter((letter) => letter !== undefined);
  const letters = words.length > 1 ? [words[0], words.at(-1)] : words;
  return letters.join('').toUpperCase() || '?';
}

export const presentPerson = (person: { id: string; name: string }): PersonSummary => ({
  id: person.id,
  name: person.name,
  initials: initialsOf(person.name),
});
