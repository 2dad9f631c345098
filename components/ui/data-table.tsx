import type { ReactNode } from "react";

type Row = { key: string; name: ReactNode; cells: ReactNode[] };

/**
 * Rows of facts. On a wide screen a table; on a narrow one each row becomes a block with its labels, so that
 * nothing has to be scrolled sideways. The roles are written out because that change of display could lose them.
 */
export function DataTable({ caption, columns, rows }: { caption: string; columns: string[]; rows: Row[] }) {
  const [first, ...others] = columns;
  return (
    <table role="table" className="stacks mt-3">
      <caption>{caption}</caption>
      <thead role="rowgroup">
        <tr role="row">
          {[first, ...others].map((column) => (
            <th key={column} role="columnheader" scope="col">
              {column}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map((row) => (
          <tr key={row.key} role="row">
            <th role="rowheader" scope="row">
              {row.name}
            </th>
            {row.cells.map((cell, index) => (
              <td key={index} role="cell">
                <span className="stack-label" aria-hidden="true">
                  {others[index]}:{" "}
                </span>
                {cell}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
