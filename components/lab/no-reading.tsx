import type { ReactElement } from 'react';
import { EmptyState } from '@/components/ui/empty-state';

/** A nest without a reading one may see: why there is no comb, and what comes next. */
export function NoReading({ hidden }: { hidden: boolean }): ReactElement {
  return hidden ? (
    <EmptyState title="The comb is hidden from you for now">
      <p>You have a second reading open at this nest. Hand it in first; then you can see what others read.</p>
    </EmptyState>
  ) : (
    <EmptyState title="No comb read yet">
      <p>Start a reading in the phone app at the next visit. Its cells appear here once the phone has sent them.</p>
    </EmptyState>
  );
}
