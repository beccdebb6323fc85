import Link from 'next/link';
import type { ReactElement } from 'react';
import { Mark } from './mark';
import { NavLink } from './nav-link';
import { ROLE_WORDS, type RoleName } from './role-words';
import { SignOutButton } from './sign-out-button';

/** Who is signed in, as the header says it. */
export interface SignedInPerson {
  displayName: string;
  role: RoleName;
  teamName: string;
}

/** The parts of the lab side; a part whose rights a role lacks is not offered. */
const PARTS: readonly { href: string; title: string; not?: RoleName; only?: readonly RoleName[] }[] = [
  { href: '/nests', title: 'Nests' },
  { href: '/review', title: 'Review', only: ['reviewer', 'biologist'] },
  { href: '/agreement', title: 'Agreement', only: ['technician', 'reviewer', 'biologist'] },
  { href: '/hosts', title: 'Hosts', not: 'researcher' },
  { href: '/downloads', title: 'Downloads', not: 'technician' },
  { href: '/settings', title: 'Settings' },
  { href: '/members', title: 'Members', only: ['coordinator'] },
  { href: '/phones', title: 'Phones', not: 'researcher' },
  { href: '/start', title: 'First steps' },
];

/** The head of every lab page: mark, parts, the phone app, who is signed in. */
export function LabHeader({ person }: { person: SignedInPerson }): ReactElement {
  const { displayName, role, teamName } = person;
  return (
    <header className="print-hidden border-b-2 border-ink">
      <div className="mx-auto flex max-w-page flex-wrap items-center gap-x-7 gap-y-1 px-4 pt-2 pb-1 sm:px-6">
        <Link href="/nests" className="flex items-center gap-3 text-lg font-bold">
          <Mark />
          Undereave
        </Link>
        <nav aria-label="Parts" className="order-last flex w-full flex-wrap gap-x-6 md:order-none md:w-auto">
          {PARTS.filter((part) => part.not !== role && (part.only?.includes(role) ?? true)).map(({ href, title }) => (
            <NavLink key={href} href={href}>
              {title}
            </NavLink>
          ))}
          {role !== 'researcher' && (
            <a
              href="/field"
              className="inline-flex min-h-9 items-center border-y-[3px] border-transparent hover:border-b-edge"
            >
              Phone app
            </a>
          )}
        </nav>
        <div className="ml-auto flex flex-wrap items-center justify-end gap-x-3 text-right text-sm leading-tight">
          <p>
            <Link href="/account" className="inline-flex min-h-6 items-center font-bold underline underline-offset-4">
              {displayName}
            </Link>
            , {ROLE_WORDS[role]}
            <span className="block text-quiet max-sm:sr-only">{teamName}</span>
          </p>
          <SignOutButton />
        </div>
      </div>
    </header>
  );
}
