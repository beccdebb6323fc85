import type { ReactElement } from 'react';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { STATE_WORDS } from '@/lib/comb/states';
import type { ComparedView } from './review-shapes';

/** Which state one reader called what: rows are the field's words, columns the lab's. Only words that were used. */
export function ConfusionSection({ compared }: { compared: ComparedView }): ReactElement {
  const { categories, counts } = compared.figures.table;
  const used = categories.flatMap((state, at) => {
    const total =
      (counts[at] ?? []).reduce((sum, n) => sum + n, 0) + counts.reduce((sum, row) => sum + (row[at] ?? 0), 0);
    return total > 0 ? [{ state, at }] : [];
  });
  if (used.length === 0) return <p className="text-quiet">There is no cell both could read.</p>;
  return (
    <Table caption="Field states by lab states" scrolls className="w-auto!">
      <thead>
        <tr>
          <HeadCell>field ↓ lab →</HeadCell>
          {used.map(({ state }) => (
            <HeadCell key={state} className="text-right">
              {STATE_WORDS[state]}
            </HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {used.map((row) => (
          <tr key={row.state}>
            <th scope="row" className="border-b border-rule py-1 pr-2 text-left font-bold">
              {STATE_WORDS[row.state]}
            </th>
            {used.map((column) => {
              const count = counts[row.at]?.[column.at] ?? 0;
              const isApart = row.at !== column.at && count > 0;
              return (
                <BodyCell key={column.state} number className={isApart ? 'font-bold underline' : ''}>
                  {count === 0 ? '·' : count}
                </BodyCell>
              );
            })}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
