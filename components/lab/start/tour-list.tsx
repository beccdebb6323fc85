import type { ReactElement } from 'react';
import { ROLE_WORDS, type RoleName } from '@/components/shell/role-words';
import { LinkButton } from '@/components/ui/link-button';
import { TOUR, type TourStop, stopHref } from './tour-stops';

interface TourListProps {
  role: RoleName;
  /** The ids of the demo's nests in this team, by code. */
  nests: Readonly<Record<string, string>>;
}

function listOf(words: readonly string[]): string {
  return words.length < 2 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} or ${words.at(-1)}`;
}

/** Why a stop can't be opened here. */
function whyNot({ at, roles }: TourStop, role: RoleName): string {
  if (roles && !roles.includes(role)) {
    return `To see it, sign in as ${listOf(roles.map((name) => ROLE_WORDS[name]))}.`;
  }
  return 'nest' in at ? `${at.nest} belongs to the demo season, which is not in this team.` : '';
}

function actWords({ at }: TourStop): string {
  return 'nest' in at ? `Go to ${at.nest}` : 'Go there';
}

/** The walk through the demo season, stop by stop. */
export function TourList({ role, nests }: TourListProps): ReactElement {
  return (
    <ol className="flex max-w-[46rem] flex-col">
      {TOUR.map((stop, index) => {
        const href = stopHref(stop, role, nests);
        return (
          <li key={stop.title} className="keep-together border-b border-rule py-4 first:border-t">
            <h2 className="text-lg font-bold">
              <span className="mr-2 font-mono text-quiet">{index + 1}</span>
              {stop.title}
            </h2>
            <p className="mt-1">{stop.words}</p>
            <ul className="mt-2 list-disc pl-5">
              {stop.look.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
            {href ? (
              <LinkButton href={href} className="mt-3" aria-label={`${actWords(stop)}: ${stop.title}`}>
                {actWords(stop)}
              </LinkButton>
            ) : (
              <p className="mt-2 text-sm text-quiet">{whyNot(stop, role)}</p>
            )}
          </li>
        );
      })}
    </ol>
  );
}
