import type { ComponentType, ReactElement } from 'react';
import { CombKey } from '@/components/comb/comb-key';
import { KeyList } from './key-list';

/** Which screen help is asked on. */
export type HelpTopic = 'nests' | 'nest' | 'visit' | 'recorder' | 'unsent' | 'settings';

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

function SettingsHelp(): ReactElement {
  return <p>Who works on this phone, what it keeps, and how to sign out without losing anything.</p>;
}

/** Help by screen: its title and its words. All of it is part of the app and opens without signal. */
export const HELP: Readonly<Record<HelpTopic, { title: string; Body: ComponentType }>> = {
  nests: { title: 'Help: nests', Body: NestsHelp },
  nest: { title: 'Help: a nest', Body: NestHelp },
  visit: { title: 'Help: a visit', Body: VisitHelp },
  recorder: { title: 'Help: reading a comb', Body: RecorderHelp },
  unsent: { title: 'Help: unsent work', Body: UnsentHelp },
  settings: { title: 'Help: settings', Body: SettingsHelp },
};
