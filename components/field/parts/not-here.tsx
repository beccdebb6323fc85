import type { ReactElement, ReactNode } from 'react';
import { FieldLink } from './field-button';
import { FIELD_ROOT } from '@/components/field/routing/field-route';
import { Screen } from './screen';

interface NotHereProps {
  title: string;
  children: ReactNode;
}

/** A screen for what cannot be shown: why, and the way home. */
function NotHere({ title, children }: NotHereProps): ReactElement {
  return (
    <Screen title={title}>
      <div>{children}</div>
      <FieldLink tone="main" href={FIELD_ROOT}>
        To the nests
      </FieldLink>
    </Screen>
  );
}

/** A path the app does not know. */
export function UnknownPath(): ReactElement {
  return (
    <NotHere title="There is no such page">
      <p>The address may be mistyped or from an older version. Nothing on this phone is lost.</p>
    </NotHere>
  );
}

/** A nest, visit or reading that this phone does not hold. */
export function NotOnThisPhone({ what }: { what: string }): ReactElement {
  return (
    <NotHere title={`This ${what} is not on this phone`}>
      <p>It may have been made on another phone and has not come here yet. With signal it comes by itself.</p>
    </NotHere>
  );
}
