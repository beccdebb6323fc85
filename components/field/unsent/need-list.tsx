import type { ReactElement } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { FieldLink } from '@/components/field/parts/field-button';
import { SIGN_IN_HREF } from '@/components/field/frame/sign-in-again';
import type { Need } from '@/lib/offline/sync-status';

/** What a need is called and what the person does about it. */
function needWords(need: Need): { title: string; todo: string } {
  switch (need.what) {
    case 'sign-in':
      return {
        title: 'Sign in again',
        todo: 'The office wants to know who sends. Everything is kept on this phone until then.',
      };
    case 'revoked':
      return {
        title: 'This phone was withdrawn',
        todo: 'It may not send any more. Make a copy below and ask your coordinator.',
      };
    case 'role':
      return { title: 'Your role may not send', todo: 'Ask your coordinator. Everything stays on this phone.' };
    case 'update':
      return {
        title: 'This app is too old',
        todo: 'Close it and open it again where there is signal. Unsent work is kept.',
      };
    case 'cleared':
      return {
        title: 'The browser has cleared this phone’s storage',
        todo: 'Load the app again where there is signal. What had reached the office comes back.',
      };
    case 'refused':
      return { title: `${countWords(need.count, 'item')} not accepted`, todo: 'See below what happened to each.' };
    case 'suspect':
      return {
        title: `${countWords(need.count, 'item')} the office could not read`,
        todo: 'See below. They hold nothing else up.',
      };
    case 'set-aside':
      return {
        title: `${countWords(need.count, 'item')} set aside at the office`,
        todo: 'See below what happened to each.',
      };
    case 'not-saved':
      return {
        title: `${countWords(need.count, 'press', 'presses')} not saved`,
        todo: 'Go back to the reading and try again, or make a copy now.',
      };
  }
}

/** Everything a person has to do before all of it can reach the office. */
export function NeedList({ needs }: { needs: readonly Need[] }): ReactElement {
  return (
    <>
      {needs.map((need) => {
        const { title, todo } = needWords(need);
        return (
          <Notice key={need.what} tone="stop" title={title}>
            <p>{todo}</p>
            {need.what === 'sign-in' && (
              <FieldLink tone="main" href={SIGN_IN_HREF} className="mt-2">
                Sign in again
              </FieldLink>
            )}
          </Notice>
        );
      })}
    </>
  );
}
