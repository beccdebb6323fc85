import type { ReactElement } from 'react';
import { countWords, fullDateWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { PlaceView } from './lab-shapes';
import { pointWords } from './lab-words';
import { NestCode } from './nest-code';

/** A release place and who offers it. */
export interface HostView {
  id: string;
  code: string;
  name: string;
  placeName: string;
  place: PlaceView | null;
  capacity: number;
  /** Null for people who only need the way there. */
  note: string | null;
  /** `YYYY-MM-DD` when the host took the offer back. */
  withdrawnOn: string | null;
}

interface HostsTableProps {
  hosts: readonly HostView[];
  /** Places are rounded for this reader. */
  rounded: boolean;
}

function room({ capacity, withdrawnOn }: HostView): string {
  return withdrawnOn ? `withdrew on ${fullDateWords(withdrawnOn)}` : countWords(capacity, 'nest');
}

/** The places nests may be moved to, with their room and what to know about them. */
export function HostsTable({ hosts, rounded }: HostsTableProps): ReactElement {
  return (
    <Table caption="Hosts">
      <thead>
        <tr>
          <HeadCell>Host</HeadCell>
          <HeadCell>Room for</HeadCell>
          <HeadCell className="max-sm:hidden">Notes</HeadCell>
        </tr>
      </thead>
      <tbody>
        {hosts.map((host) => (
          <tr key={host.id}>
            <BodyCell>
              <p className="flex flex-wrap items-baseline gap-x-2">
                <NestCode>{host.code}</NestCode> <span className="font-bold">{host.placeName}</span>
              </p>
              <p className="mt-1">{host.name}</p>
              {host.place && <p className="text-sm text-quiet">{pointWords(host.place, rounded)}</p>}
              {host.note && <p className="mt-1 sm:hidden">{host.note}</p>}
            </BodyCell>
            <BodyCell className={host.withdrawnOn ? 'text-stop' : 'whitespace-nowrap'}>{room(host)}</BodyCell>
            <BodyCell className="max-w-text max-sm:hidden">
              {host.note ?? <span className="text-quiet">none</span>}
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
