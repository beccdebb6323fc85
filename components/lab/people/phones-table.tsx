import type { ReactElement } from 'react';
import { dayWords, momentWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { TimeView } from './people-shapes';
import { type PhoneView, unsentWords } from './phone-words';
import { RevokeDialog } from './revoke-dialog';

interface PhonesProps extends TimeView {
  phones: readonly PhoneView[];
}

/** Something that may be lost with the phone stands out. */
function unsentLook({ unsent }: PhoneView): string {
  return unsent ? 'font-bold text-warn' : '';
}

/** The phones that may send, with what they held when last seen. */
export function PhonesTable({ phones, zone, today }: PhonesProps): ReactElement {
  return (
    <Table caption="Phones in use">
      <thead>
        <tr>
          <HeadCell>Phone</HeadCell>
          <HeadCell className="max-sm:hidden">Last seen</HeadCell>
          <HeadCell className="max-sm:hidden">Unsent then</HeadCell>
          <HeadCell>
            <span className="sr-only">Acts</span>
          </HeadCell>
        </tr>
      </thead>
      <tbody>
        {phones.map((phone) => (
          <tr key={phone.id}>
            <BodyCell className="[overflow-wrap:anywhere]">
              <span className="font-bold">{phone.label}</span>
              <span className="block text-sm">{phone.own ? 'yours' : phone.person}</span>
              <span className="block text-sm text-quiet">since {dayWords(phone.enrolledAt, zone, today)}</span>
              <span className="block text-sm sm:hidden">
                last seen {momentWords(phone.lastSeenAt, zone, today)}, unsent then:{' '}
                <span className={unsentLook(phone)}>{unsentWords(phone.unsent)}</span>
              </span>
            </BodyCell>
            <BodyCell className="max-sm:hidden">{momentWords(phone.lastSeenAt, zone, today)}</BodyCell>
            <BodyCell className={`max-sm:hidden ${unsentLook(phone)}`}>{unsentWords(phone.unsent)}</BodyCell>
            <BodyCell>
              <div className="flex justify-end">
                <RevokeDialog phone={phone} />
              </div>
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** The phones that were withdrawn, by whom and why. */
export function RevokedPhones({ phones, zone, today }: PhonesProps): ReactElement {
  return (
    <ul className="flex flex-col">
      {phones.map(({ id, label, person, unsent, revoked }) => (
        <li key={id} className="border-b border-rule py-1.5 [overflow-wrap:anywhere]">
          <span className="font-bold">{label}</span>, {person}
          {revoked && (
            <span className="block text-sm">
              Withdrawn on {momentWords(revoked.at, zone, today)} by {revoked.by}: {revoked.reason}
            </span>
          )}
          <span className="block text-sm text-quiet">Unsent when last seen: {unsentWords(unsent)}</span>
        </li>
      ))}
    </ul>
  );
}
