import type { ReactElement } from 'react';
import { ROLE_WORDS } from '@/components/shell/role-words';
import { dayWords, momentWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { MemberDialog } from './member-dialog';
import type { MemberView, TimeView } from './people-shapes';

interface MembersTableProps extends TimeView {
  members: readonly MemberView[];
}

function lastHere({ lastSeenAt }: MemberView, { zone, today }: TimeView): string {
  return lastSeenAt === null ? 'never signed in' : momentWords(lastSeenAt, zone, today);
}

/** Everybody of the team with role and last visit. */
export function MembersTable({ members, ...time }: MembersTableProps): ReactElement {
  return (
    <Table caption="Members">
      <thead>
        <tr>
          <HeadCell>Person</HeadCell>
          <HeadCell className="max-sm:hidden">Role</HeadCell>
          <HeadCell className="max-sm:hidden">Last here</HeadCell>
          <HeadCell>
            <span className="sr-only">Acts</span>
          </HeadCell>
        </tr>
      </thead>
      <tbody>
        {members.map((member) => (
          <tr key={member.id}>
            <BodyCell className="[overflow-wrap:anywhere]">
              <span className="font-bold">{member.name}</span>
              <span className="block text-sm text-quiet">{member.email}</span>
              <span className="block text-sm sm:hidden">
                {ROLE_WORDS[member.role]}, {lastHere(member, time)}
              </span>
            </BodyCell>
            <BodyCell className="max-sm:hidden">{ROLE_WORDS[member.role]}</BodyCell>
            <BodyCell className="whitespace-nowrap max-sm:hidden">{lastHere(member, time)}</BodyCell>
            <BodyCell>
              <div className="flex justify-end">
                <MemberDialog key={`${member.role}${member.sessions}`} member={member} />
              </div>
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** Who was a member: their names stand beside records, so they are not forgotten. */
export function FormerMembers({ members, zone, today }: MembersTableProps): ReactElement {
  return (
    <ul className="flex flex-col">
      {members.map(({ id, name, email, role, endedAt }) => (
        <li key={id} className="border-b border-rule py-1.5 [overflow-wrap:anywhere]">
          <span className="font-bold">{name}</span>, {ROLE_WORDS[role]}
          {endedAt && ` until ${dayWords(endedAt, zone, today)}`}
          <span className="text-sm text-quiet">, {email}</span>
        </li>
      ))}
    </ul>
  );
}
