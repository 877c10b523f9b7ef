interface TableTwinProps {
  caption: string;
  /** The first column names the row; the others are figures. */
  heads: readonly string[];
  rows: readonly (readonly string[])[];
}

/** The numbers of a chart as a table, on request. */
export function TableTwin({ caption, heads, rows }: TableTwinProps) {
  return (
    <details className="text-small">
      <summary className="w-fit text-indigo underline decoration-1 underline-offset-[3px]">The numbers as a table</summary>
      <div role="region" aria-label={`${caption}: numbers`} tabIndex={0} className="relative mt-2 max-h-64 w-fit max-w-full overflow-auto border-y border-thread">
        <table className="border-collapse">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              {heads.map((head, index) => (
                <th key={head} scope="col" className={`py-1 font-semibold text-ink-soft first-letter:uppercase ${index === 0 ? 'pr-8 text-left' : 'pl-4 text-right'}`}>{head}</th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row[0]} className="border-t border-thread">
                <th scope="row" className="py-0.5 pr-8 text-left font-normal">{row[0]}</th>
                {row.slice(1).map((cell, index) => <td key={heads[index + 1]} className="py-0.5 pl-4 text-right">{cell}</td>)}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
