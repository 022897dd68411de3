import { useEffect, type JSX } from 'react';
import { Link, useLocation } from 'react-router-dom';

import { Logo } from '#client/components/logo.tsx';
import { Page, PageHeader } from '#client/components/page.tsx';
import { MethodsArticle } from '#client/features/methods/components/methods-article.tsx';
import { dataSection } from '#client/features/methods/model/data-section.ts';
import { electrostaticSections } from '#client/features/methods/model/electrostatic-sections.ts';
import {
  cautionSection,
  energeticSections,
} from '#client/features/methods/model/energetic-sections.ts';

const sections = [...electrostaticSections, ...energeticSections, dataSection(), cautionSection];

/** `/methods`: what every number means, open to anyone. */
export function Component(): JSX.Element {
  const { hash } = useLocation();
  useEffect(() => {
    // The page is drawn after the address is known, so the browser does not find the anchor itself.
    document.getElementById(hash.slice(1))?.scrollIntoView();
  }, [hash]);
  return (
    <div className="min-h-dvh">
      <header className="flex h-14 items-center gap-4 border-b border-line px-4 md:px-7 print:hidden">
        <Link to="/" aria-label="Holdfast, start" className="rounded-control">
          <Logo />
        </Link>
      </header>
      <main id="main" tabIndex={-1}>
        <Page title="Methods" className="mx-auto w-full max-w-6xl">
          <PageHeader title="Methods" />
          <p className="mt-2 max-w-prose text-soft">
            Every convention, formula, constant and source behind the numbers.
          </p>
          <MethodsArticle sections={sections} />
        </Page>
      </main>
    </div>
  );
}
