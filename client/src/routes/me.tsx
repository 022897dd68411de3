import type { JSX, ReactNode } from 'react';

import { Page, PageHeader } from '#client/components/page.tsx';
import { PasswordForm } from '#client/features/account/components/password-form.tsx';
import { ProfileForm } from '#client/features/account/components/profile-form.tsx';
import { Sessions } from '#client/features/account/components/sessions.tsx';
import { useCurrentUser } from '#client/lib/session.ts';

function Section({ title, children }: { title: string; children: ReactNode }): JSX.Element {
  return (
    <section className="py-7">
      <h2 className="text-lead">{title}</h2>
      {children}
    </section>
  );
}

/** /me */
export function Component(): JSX.Element {
  const user = useCurrentUser();
  return (
    <Page title="Account" width="reading">
      <PageHeader title="Account" />
      <div className="rule-list">
        <Section title="Who you are">
          <ProfileForm user={user} />
        </Section>
        <Section title="Password">
          <PasswordForm email={user.email} />
        </Section>
        <Section title="Where you are signed in">
          <Sessions />
        </Section>
      </div>
    </Page>
  );
}
