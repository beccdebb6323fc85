import type { RoleName } from '@/components/shell/role-words';
import { countWords } from '@/components/ui/date-words';

/** How far a team has come with its first nest. */
export interface FirstStepsView {
  technicians: number;
  invited: number;
  phones: number;
  nests: number;
  readings: number;
  dated: { id: string; code: string } | null;
}

/** Done; the one to take now; begun, but in somebody else's hands; or still to come. */
export type StepState = 'done' | 'now' | 'waiting' | 'later';

/** One step on the way to a first dated nest. */
export interface FirstStep {
  key: string;
  title: string;
  state: StepState;
  /** What there is, when it is done or begun. */
  has: string | null;
  how: string;
  /** Where to do it; null for a reader who has no hand in it. */
  way: { href: string; words: string } | null;
}

type Draft = Omit<FirstStep, 'state'> & { isDone: boolean; isWaiting?: boolean };

function recordersWay(role: RoleName): FirstStep['way'] {
  const records = role === 'technician' || role === 'reviewer' || role === 'biologist';
  return records ? { href: '/field', words: 'Open the phone app' } : null;
}

/** Technicians there are, else those asked; null without either. */
function peopleWords({ technicians, invited }: FirstStepsView): string | null {
  if (technicians > 0) return countWords(technicians, 'technician');
  return invited > 0 ? `${countWords(invited, 'invitation')} not answered yet` : null;
}

function people(view: FirstStepsView, role: RoleName): Draft {
  const { technicians, invited } = view;
  return {
    key: 'invite',
    title: 'Invite a technician',
    isDone: technicians > 0,
    isWaiting: technicians === 0 && invited > 0,
    has: peopleWords(view),
    how: 'A technician reads combs at the nest. A coordinator gives an e-mail address; the letter holds a link that works for seven days.',
    way: role === 'coordinator' ? { href: '/members', words: 'Invite somebody' } : null,
  };
}

function phoneStep({ phones }: FirstStepsView, role: RoleName): Draft {
  return {
    key: 'enrol',
    title: 'Enrol a phone',
    isDone: phones > 0,
    has: phones > 0 ? `${countWords(phones, 'phone')} enrolled` : null,
    how: 'On the phone, where there is signal: open this site, sign in, choose Phone app, and add it to the home screen. It enrols by itself and then works without signal.',
    way: recordersWay(role),
  };
}

function nestSteps({ nests, readings, dated }: FirstStepsView, role: RoleName): Draft[] {
  return [
    {
      key: 'nest',
      title: 'Open a nest',
      isDone: nests > 0,
      has: nests > 0 ? countWords(nests, 'nest') : null,
      how: 'In the phone app, under Nests: give her a code, the species as far as you know it, and the place. A practice nest on paper will do for the first time.',
      way: recordersWay(role),
    },
    {
      key: 'read',
      title: 'Read her comb',
      isDone: readings > 0,
      has: readings > 0 ? `${countWords(readings, 'reading')} handed in` : null,
      how: 'In the nest: start a visit, then a reading. The app goes from cell to cell, you press what is in each. At the end, hand it in; it is sent when there is signal.',
      way: recordersWay(role),
    },
    {
      key: 'dates',
      title: 'See the dates',
      isDone: dated !== null,
      has: dated && `dates of ${dated.code}`,
      how: 'On the page of the nest: when each cell was laid, capped and opens, always as a range, with what the range rests on one press away.',
      way: dated && { href: `/nests/${dated.id}`, words: `Open ${dated.code}` },
    },
  ];
}

/** The way to a first dated nest, each step with its state for this reader. */
export function firstStepsOf(view: FirstStepsView, role: RoleName): FirstStep[] {
  const drafts = [people(view, role), phoneStep(view, role), ...nestSteps(view, role)];
  const now = drafts.findIndex(({ isDone, isWaiting }) => !isDone && !isWaiting);
  return drafts.map(({ isDone, isWaiting, ...step }, index) => {
    const open: StepState = index === now ? 'now' : 'later';
    const begun: StepState = isWaiting ? 'waiting' : open;
    return { ...step, state: isDone ? 'done' : begun };
  });
}
