import type { ReactElement } from 'react';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { CELL_STATES, STATE_WORDS } from '@/lib/comb/states';
import { tallyOf } from '@/lib/comb/tally';
import type { ComparedView } from './review-shapes';

function signed(difference: number): string {
  if (difference === 0) return '0';
  return difference > 0 ? `+${difference}` : `−${-difference}`;
}

/** Both tallies beside each other, with what the lab counts more or less. */
export function TallyDifference({ compared }: { compared: ComparedView }): ReactElement {
  const [field, lab] = [tallyOf(compared.field), tallyOf(compared.lab)];
  const rows = [
    { name: 'cells', field: field.cellsTotal, lab: lab.cellsTotal },
    ...CELL_STATES.map((state) => ({ name: STATE_WORDS[state], field: field[state], lab: lab[state] })),
    { name: 'nectar in', field: field.nectarCells, lab: lab.nectarCells },
  ].filter((row) => row.field + row.lab > 0);
  return (
    <Table caption="Both tallies" className="max-w-md">
      <thead>
        <tr>
          <HeadCell>State</HeadCell>
          <HeadCell className="text-right">Field</HeadCell>
          <HeadCell className="text-right">Lab</HeadCell>
          <HeadCell className="text-right">Difference</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.name}>
            <BodyCell>{row.name}</BodyCell>
            <BodyCell number>{row.field}</BodyCell>
            <BodyCell number>{row.lab}</BodyCell>
            <BodyCell number>{signed(row.lab - row.field)}</BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
