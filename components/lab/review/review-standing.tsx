import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import { countWords } from '@/components/ui/date-words';
import type { ComparedView, FinalStandingView } from './review-shapes';

interface ReviewStandingProps {
  compared: ComparedView | null;
  final: FinalStandingView | null;
  /** The least share of cells read alike for a reviewer to settle alone. */
  threshold: number;
  settingsVersion: number;
  /** Is the person the lead biologist? */
  leads: boolean;
}

function percent(share: number): string {
  return `${Math.round(share * 1000) / 10} %`;
}

function SettlerNotice({
  compared,
  threshold,
  settingsVersion,
  leads,
}: Omit<ReviewStandingProps, 'final' | 'compared'> & { compared: ComparedView }): ReactElement {
  const { settler, agreement } = compared;
  const by = `At least ${percent(threshold)} read alike and no clash lets a reviewer settle alone (settings version ${settingsVersion}).`;
  if (settler === 'reviewer') {
    return (
      <Notice title="A reviewer may settle this alone." className="mb-4">
        <p>{by}</p>
      </Notice>
    );
  }
  return (
    <Notice tone="warn" title="The lead biologist settles this, as third reader." className="mb-4">
      <p>
        {by} Here {agreement.alike} of {agreement.compared} are read alike, with{' '}
        {countWords(agreement.clashes, 'clash', 'clashes')} over capped, dead, parasitised or webbed.
        {!leads && ' You can read everything here.'}
      </p>
    </Notice>
  );
}

/** Who may settle, whether it is locked, and whether later marks have overtaken the lock. */
export function ReviewStanding(props: ReviewStandingProps): ReactElement {
  const { compared, final } = props;
  const isLocked = final !== null && final.version === final.lockedVersion;
  return (
    <>
      {final?.stale && (
        <Notice tone="warn" title="Marks came later" className="mb-4">
          <p>
            The field reading was changed after the final reading was made from it. The final reading does not move;
            amend it if the later marks matter.
          </p>
        </Notice>
      )}
      {isLocked && (
        <Notice title={`Version ${final.version} is locked.`} className="mb-4">
          <p>Nothing is overwritten: both originals and every version are kept.</p>
        </Notice>
      )}
      {compared && <SettlerNotice {...props} compared={compared} />}
      {!compared && (
        <Notice className="mb-4">
          <p>There is no second reading to compare with yet.</p>
        </Notice>
      )}
    </>
  );
}
