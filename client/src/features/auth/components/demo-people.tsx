import type { JSX } from 'react';

import type { Role, SessionState } from '#common/schemas/auth';
import { PersonBadge } from '#client/components/person-badge.tsx';

interface DemoPeopleProps {
  demo: NonNullable<SessionState['demo']>;
  isDisabled: boolean;
  onChoose: (email: string) => void;
}

/** What each role is for, in the words of the sign-in page. */
const does: Record<Role, string> = {
  owner: 'runs the workspace',
  crystallographer: 'defines cells',
  reviewer: 'remarks, accepts, returns',
  reader: 'reads',
};

const initialsOf = (name: string): string =>
  name
    .split(/\s+/)
    .map((part) => part.charAt(0))
    .filter((_, index, all) => index === 0 || index === all.length - 1)
    .join('')
    .toUpperCase();

/** The people of the demonstration; one click signs in as one of them. */
export function DemoPeople({ demo, isDisabled, onChoose }: DemoPeopleProps): JSX.Element {
  return (
    <section aria-labelledby="demo-people" className="mt-9">
      <h2 id="demo-people" className="text-body">
        This is a demonstration
      </h2>
      <p className="mt-1 text-small text-soft">
        Everyone in the workspace {demo.workspaceName} is invented. Step into one of their places;
        the password of each is{' '}
        <span className="font-medium whitespace-nowrap text-ink">{demo.password}</span>.
      </p>
      <ul className="rule-list mt-3 rounded-control border border-line bg-raised">
        {demo.people.map((person) => (
          <li key={person.email}>
            <button
              type="button"
              disabled={isDisabled}
              onClick={() => onChoose(person.email)}
              aria-label={`Sign in as ${person.name}, ${person.role}`}
              className="group flex w-full items-center gap-3 px-3 py-2 text-left -outline-offset-2 hover:bg-wash disabled:opacity-55"
            >
              <PersonBadge name={person.name} initials={initialsOf(person.name)} isDecorative />
              <span className="min-w-0 grow">
                <span className="block truncate font-medium">{person.name}</span>
                <span className="block text-small text-soft">
                  {person.role}: {does[person.role]}
                </span>
              </span>
              <span className="text-small whitespace-nowrap text-soft underline decoration-line underline-offset-4 group-hover:text-ink group-hover:decoration-ink">
                Sign in as
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
