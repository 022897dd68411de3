import type { JSX } from 'react';

import { Formula } from '#client/features/methods/components/formula.tsx';
import type {
  MethodBlock,
  MethodSection,
  MethodTable,
} from '#client/features/methods/model/method-section.ts';

function Table({ table }: { table: MethodTable }): JSX.Element {
  return (
    <div className="my-4 overflow-x-auto" tabIndex={0} role="group" aria-label={table.caption}>
      <table className="w-full min-w-md text-small [overflow-wrap:break-word]">
        <caption className="pb-2 text-left text-soft">{table.caption}</caption>
        <thead>
          <tr className="border-b border-faint text-left">
            {table.heads.map((head) => (
              <th key={head} scope="col" className="py-1.5 pr-4 font-medium">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, index) => (
            <tr key={index} className="border-b border-line align-top">
              {row.map((cell, at) => (
                <td key={at} className="py-1.5 pr-4">
                  {cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Block({ block }: { block: MethodBlock }): JSX.Element {
  switch (block.kind) {
    case 'text':
      return <p className="my-3 max-w-prose">{block.text}</p>;
    case 'formula':
      return <Formula text={block.text} />;
    case 'table':
      return <Table table={block.table} />;
  }
}

/** All sections, each with an anchor, and the list of them beside. */
export function MethodsArticle({ sections }: { sections: readonly MethodSection[] }): JSX.Element {
  return (
    <div className="mt-6 gap-12 wide:grid wide:grid-cols-[14rem_minmax(0,1fr)]">
      <nav aria-label="On this page" className="print:hidden">
        <ol className="columns-2 gap-6 text-small wide:sticky wide:top-6 wide:columns-1">
          {sections.map(({ id, title }) => (
            <li key={id} className="break-inside-avoid py-1">
              <a href={`#${id}`} className="underline-offset-4 hover:underline">
                {title}
              </a>
            </li>
          ))}
        </ol>
      </nav>
      <div>
        {sections.map(({ id, title, blocks }) => (
          <section key={id} id={id} aria-labelledby={`${id}-title`} className="scroll-mt-4">
            <h2 id={`${id}-title`} className="mt-8 border-t border-ink pt-3 text-lead first:mt-6">
              {title}
            </h2>
            {blocks.map((block, index) => (
              <Block key={index} block={block} />
            ))}
          </section>
        ))}
      </div>
    </div>
  );
}
