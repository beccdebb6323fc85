'use client';

import type { ReactElement } from 'react';
import { FieldFrame } from './frame/field-frame';
import { NestScreen } from './nests/nest-screen';
import { NestsScreen } from './nests/nests-screen';
import { NewNestScreen } from './nests/new-nest-screen';
import { BlankSheetScreen, SheetScreen } from './paper/sheet-screen';
import { TypedScreen } from './paper/typed-screen';
import { UnknownPath } from './parts/not-here';
import { ReadingScreen } from './readings/reading-screen';
import { parseFieldPath } from './routing/field-route';
import { SettingsScreen } from './settings/settings-screen';
import { BringInScreen } from './unsent/bring-in-screen';
import { UnsentScreen } from './unsent/unsent-screen';
import { NewVisitScreen } from './visits/new-visit-screen';
import { VisitScreen } from './visits/visit-screen';

function UnknownScreen(): ReactElement {
  return (
    <FieldFrame help="nests">
      <UnknownPath />
    </FieldFrame>
  );
}

/** The screen of a path. Screens of different entities are different screens: nothing typed in one shows in another. */
export function FieldScreen({ path }: { path: string }): ReactElement {
  const route = parseFieldPath(path);
  switch (route.kind) {
    case 'nests':
      return <NestsScreen />;
    case 'new-nest':
      return <NewNestScreen />;
    case 'nest':
      return <NestScreen key={route.id} id={route.id} />;
    case 'new-visit':
      return <NewVisitScreen key={route.id} id={route.id} />;
    case 'visit':
      return <VisitScreen key={route.id} id={route.id} />;
    case 'reading':
      return <ReadingScreen key={route.id} id={route.id} />;
    case 'sheet':
      return <SheetScreen key={route.id} id={route.id} />;
    case 'blank-sheet':
      return <BlankSheetScreen />;
    case 'typed':
      return <TypedScreen key={route.id} id={route.id} />;
    case 'unsent':
      return <UnsentScreen />;
    case 'bring-in':
      return <BringInScreen />;
    case 'settings':
      return <SettingsScreen />;
    case 'unknown':
      return <UnknownScreen />;
  }
}
