import type { JSX } from 'react';

import type { ReportBlock, ReportFigure, ReportSection, ReportTable } from '#common/schemas/report';

function Figures({ figures }: { figures: readonly ReportFigure[] }): JSX.Element {
  const columns = figures.every(({ note }) => note === '')
    ? 'grid-cols-2 sm:grid-cols-3'
    : 'sm:grid-cols-2';
  return (
    <dl className={`my-3 grid gap-x-8 gap-y-3 ${columns}`}>
      {figures.map(({ name, text, unit, note }) => (
        <div key={name} className="break-inside-avoid">
          <dt className="text-small text-soft">{name}</dt>
          <dd>
            <span className="text-lead font-bold">{text}</span>
            {unit !== '' && <span className="text-soft">{unit === '°' ? unit : ` ${unit}`}</span>}
            {note !== '' && <span className="block text-small text-soft">{note}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}

function Table({ table, title }: { table: ReportTable; title: string }): JSX.Element {
  const side = (k: number): string =>
    table.columns[k]?.align === 'right' ? 'text-right' : 'text-left';
  const line = (row: readonly string[], key: string, weight: string): JSX.Element => (
    <tr key={key} className={`break-inside-avoid border-b border-line ${weight}`}>
      {row.map((cell, k) => (
        <td key={k} className={`py-1 pr-3 last:pr-0 ${side(k)}`}>
          {cell}
        </td>
      ))}
    </tr>
  );
  const name = table.caption === '' ? title : table.caption;
  return (
    <div
      className="my-3 overflow-x-auto print:overflow-visible"
      tabIndex={0}
      role="group"
      aria-label={name}
    >
      <table className="w-full min-w-md text-small [overflow-wrap:break-word]">
        <caption className={table.caption === '' ? 'sr-only' : 'pb-1 text-left text-soft'}>
          {name}
        </caption>
        <thead>
          <tr className="border-b border-faint">
            {table.columns.map(({ title: head }, k) => (
              <td key={k} className={`py-1 pr-3 font-medium text-soft last:pr-0 ${side(k)}`}>
                {head}
              </td>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, index) => line(row, `row ${index}`, ''))}
          {table.closing.map((row, index) => line(row, `closing ${index}`, 'font-bold'))}
        </tbody>
      </table>
    </div>
  );
}

function Block({ block, title }: { block: ReportBlock; title: string }): JSX.Element {
  switch (block.kind) {
    case 'text':
      return <p className="my-2 max-w-prose">{block.text}</p>;
    case 'figures':
      return <Figures figures={block.figures} />;
    case 'table':
      return <Table table={block.table} title={title} />;
    case 'caution':
      return <p className="my-3 border-l-3 border-oppose bg-wash px-4 py-2.5">{block.text}</p>;
  }
}

/** The sections of a report, each under a rule. */
export function ReportSections({ sections }: { sections: readonly ReportSection[] }): JSX.Element {
  return (
    <>
      {sections.map(({ key, title, blocks }) => (
        <section
          key={key}
          aria-labelledby={`report-${key}`}
          className="mt-6 border-t border-ink pt-2"
        >
          <h2 id={`report-${key}`} className="break-after-avoid text-lead">
            {title}
          </h2>
          {blocks.map((block, index) => (
            <Block key={index} block={block} title={title} />
          ))}
        </section>
      ))}
    </>
  );
}
