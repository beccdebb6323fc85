import { useRouter } from 'next/navigation';
import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { Section } from '@/components/ui/section';
import type { SettingsChange } from '@/lib/brood/team-settings/compare-content';
import { useKeep } from '@/components/lab/use-keep';
import { ChangesTable } from './changes-table';

interface SignSectionProps {
  /** The version the draft began from. */
  basedOn: number;
  /** What the saved draft changes. */
  changes: readonly SettingsChange[];
  /** Is everything typed saved, and is there a draft at all? */
  canSign: boolean;
}

/** Signs the draft as the next version, or throws it away; both are asked about once more. */
export function SignSection({ basedOn, changes, canSign }: SignSectionProps): ReactElement {
  const router = useRouter();
  const [reason, setReason] = useState('');
  const [isOpen, setOpen] = useState(false);
  const leave = (): void => router.push('/settings');
  const { send, isSending, trouble } = useKeep(leave);
  const discard = useKeep(leave);
  const isReady = canSign && reason.trim() !== '';
  return (
    <Section id="sign" title="Sign" className="mt-8">
      <ChangesTable changes={changes} titles={[basedOn === 0 ? 'Now' : `Version ${basedOn}`, 'Draft']} />
      <Field
        id="sign-reason"
        label="Why these numbers"
        hint="Kept with the version for good, beside your name and the time."
        error={trouble ?? discard.trouble}
        required
        className="mt-4 max-w-text"
      >
        {(control) => <TextArea {...control} value={reason} onChange={({ target }) => setReason(target.value)} />}
      </Field>
      <div className="mt-3 flex flex-wrap gap-3">
        <Button tone="main" disabled={!isReady} onClick={() => setOpen(true)}>
          Sign version {basedOn + 1}
        </Button>
        <Button
          tone="stop"
          disabled={discard.isSending}
          onClick={() => discard.send({ method: 'POST', path: '/api/settings/draft/discard', body: {} })}
        >
          Throw the draft away
        </Button>
      </div>
      {!canSign && <p className="mt-1 text-sm text-quiet">A saved draft is needed before it can be signed.</p>}
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={`Sign version ${basedOn + 1}?`}>
        <p>
          From then on every new estimate is made with it, and it can’t be changed any more. Earlier estimates keep
          their version.
        </p>
        <div className="mt-5 flex flex-wrap gap-3">
          <Button
            tone="main"
            disabled={isSending}
            onClick={() => {
              setOpen(false);
              send({ method: 'POST', path: '/api/settings/sign', body: { reason: reason.trim(), basedOn } });
            }}
          >
            Sign it
          </Button>
          <Button onClick={() => setOpen(false)}>Not yet</Button>
        </div>
      </Dialog>
    </Section>
  );
}
