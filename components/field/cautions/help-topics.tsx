import type { ComponentType, ReactElement } from 'react';
import { CombKey } from '@/components/comb/comb-key';
import { KeyList } from './key-list';

/** Which screen help is asked on. */
export type HelpTopic =
  | 'nests'
  | 'new-nest'
  | 'nest'
  | 'new-visit'
  | 'visit'
  | 'reading'
  | 'recorder'
  | 'sheet'
  | 'typed'
  | 'unsent'
  | 'bring-in'
  | 'settings';

function NestsHelp(): ReactElement {
  return (
    <>
      <p>
        Every nest on this phone. Press one to see its comb and visits. A nest you start here is kept at once, without
        signal.
      </p>
      <p>The corner at the top says where your work is. Press it to see what has not gone yet.</p>
    </>
  );
}

function NewNestHelp(): ReactElement {
  return (
    <>
      <p>
        A code is enough to begin: the one on the label. Where she hangs, the taxon and the place can be given later; a
        wrong taxon is worse than none.
      </p>
      <p>Take the place where the nest hangs now, before it is moved. It works without signal and may take a minute.</p>
    </>
  );
}

function NestHelp(): ReactElement {
  return (
    <>
      <p>
        A visit is one stay at the nest. A reading is one person’s marks at one visit. Two people at one nest make two
        readings; both are kept beside each other.
      </p>
      <p>The comb is drawn from below, cells facing you. 12 is the mark on the backing.</p>
      <CombKey />
    </>
  );
}

function NewVisitHelp(): ReactElement {
  return (
    <p>
      Choose why you are here. The visit begins at the moment you press the key, by this phone’s clock. Going back
      before that starts nothing.
    </p>
  );
}

function VisitHelp(): ReactElement {
  return (
    <>
      <p>
        Start a reading and press one key a cell. You can leave at any moment and go on where you were, also after a
        restart.
      </p>
      <p>
        Another person’s reading can be looked at and never changed. A second reading is made without seeing the first.
      </p>
    </>
  );
}

function ReadingHelp(): ReactElement {
  return (
    <>
      <p>
        A reading that is handed in, or another person’s. Your own can be corrected cell by cell; what was there before
        stays in its history.
      </p>
      <p>Dates come from the stages alone and are ranges. Print the comb to lay it beside the nest.</p>
      <CombKey />
    </>
  );
}

function SheetHelp(): ReactElement {
  return (
    <>
      <p>
        Write one letter into each cell, and behind it ’ for nectar or ? for unsure. Draw a line round the cells that
        are there: a blank inside it is a cell you did not read.
      </p>
      <p>
        The square holds the code below it and nothing else: no name, no place. Type the code into <em>Find a nest</em>{' '}
        to come to the nest.
      </p>
    </>
  );
}

function TypedHelp(): ReactElement {
  return (
    <>
      <p>
        Type ring by ring, clockwise from 12, as the numbers on the sheet run. Gaps and commas do not matter; Tab goes
        to the next ring.
      </p>
      <p>
        Nothing is kept before you press <strong>Keep the reading</strong>. Then it opens as any reading: compare it
        with the paper, put right what is wrong, finish, hand in. Keep the paper.
      </p>
      <CombKey />
    </>
  );
}

function RecorderHelp(): ReactElement {
  return (
    <>
      <p>
        The app names a cell; press what you see in it. It steps on by itself, ring after ring, clockwise from the
        pedicel cell. Press <strong>Nectar</strong> or <strong>Unsure</strong> before the state.{' '}
        <strong>No cell here</strong> passes a place where the comb ends.
      </p>
      <p>
        Press any cell in the picture to go to it; press a place with a plus to add a cell there. <strong>Undo</strong>{' '}
        takes back one act after the other, as far as you like.
      </p>
      <p>
        A dashed cell is not saved yet. Wait until the corner no longer says “saving” before you switch the phone off.
      </p>
      <h3 className="text-xl font-bold">Keyboard</h3>
      <KeyList />
      <h3 className="text-xl font-bold">Symbols</h3>
      <CombKey />
    </>
  );
}

function UnsentHelp(): ReactElement {
  return (
    <>
      <p>
        What is saved on this phone and not yet at the office. It goes by itself when there is signal; sending twice
        does no harm.
      </p>
      <p>
        If a phone must be handed in or will not send, make a copy of everything unsent and give the file to your
        coordinator.
      </p>
    </>
  );
}

function BringInHelp(): ReactElement {
  return (
    <>
      <p>
        Choose the file that another phone made under <em>Copy of everything unsent</em>. It is taken only when it is
        whole, yours, and of this team.
      </p>
      <p>
        Nothing is doubled: everything in it has a number of its own, and the office counts each once, whichever phone
        it came from.
      </p>
    </>
  );
}

function SettingsHelp(): ReactElement {
  return (
    <>
      <p>
        Who works on this phone, what it keeps, how it behaves in the hand, and how to sign out without losing anything.
      </p>
      <p>
        A shared phone: sign out before you hand it on. What you have not sent stays closed on it, and goes when you
        sign in here again.
      </p>
      <p>Low lamp makes the screen dim and green for dusk. Left hand mirrors the rows of keys.</p>
      <h3 className="text-xl font-bold">Keyboard, while reading</h3>
      <KeyList />
    </>
  );
}

/** Help by screen: its title and its words. All of it is part of the app and opens without signal. */
export const HELP: Readonly<Record<HelpTopic, { title: string; Body: ComponentType }>> = {
  nests: { title: 'Help: nests', Body: NestsHelp },
  'new-nest': { title: 'Help: a new nest', Body: NewNestHelp },
  nest: { title: 'Help: a nest', Body: NestHelp },
  'new-visit': { title: 'Help: a new visit', Body: NewVisitHelp },
  visit: { title: 'Help: a visit', Body: VisitHelp },
  reading: { title: 'Help: a reading', Body: ReadingHelp },
  sheet: { title: 'Help: the paper sheet', Body: SheetHelp },
  typed: { title: 'Help: typing a sheet in', Body: TypedHelp },
  recorder: { title: 'Help: reading a comb', Body: RecorderHelp },
  unsent: { title: 'Help: unsent work', Body: UnsentHelp },
  'bring-in': { title: 'Help: taking in a copy', Body: BringInHelp },
  settings: { title: 'Help: settings', Body: SettingsHelp },
};
