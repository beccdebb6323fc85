'use client';

import { type ReactElement, useEffect, useState } from 'react';
import { Part } from '@/components/field/parts/part';
import { SwitchKey } from '@/components/field/parts/switch-key';
import { setHand } from '@/components/field/hand/hand-settings';
import { useHand } from '@/components/field/hand/use-hand';
import { canBuzz, ownVoice } from '@/components/field/hand/use-press-feedback';
import { canKeepAwake } from '@/components/field/recorder/use-wake-lock';

/** Has this phone a voice of its own? Browsers list voices some time after they are first asked. */
function useHasVoice(): boolean {
  const [has, setHas] = useState(false);
  useEffect(() => {
    if (typeof speechSynthesis === 'undefined') return;
    const look = (): void => setHas(ownVoice() !== null);
    look();
    speechSynthesis.addEventListener('voiceschanged', look);
    return () => speechSynthesis.removeEventListener('voiceschanged', look);
  }, []);
  return has;
}

/** What this phone cannot do, said once instead of a switch that does nothing. */
function Cannot({ children }: { children: string }): ReactElement {
  return <p className="text-quiet">{children}</p>;
}

/** How the phone behaves in the hand: light, hand, buzz, voice, and the screen that stays awake. */
export function HandPart(): ReactElement {
  const { lamp, left, buzz, speak } = useHand();
  const hasVoice = useHasVoice();
  return (
    <Part title="In the hand">
      <SwitchKey
        title="Low lamp"
        hint="Dim and green, for dusk. Never switches by itself."
        on={lamp}
        onChange={(on) => setHand('lamp', on)}
      />
      <SwitchKey title="Left hand" hint="Mirrors the rows of keys." on={left} onChange={(on) => setHand('left', on)} />
      {canBuzz() ? (
        <SwitchKey
          title="Buzz"
          hint="Short when a press is kept, twice and longer when it is not."
          on={buzz}
          onChange={(on) => setHand('buzz', on)}
        />
      ) : (
        <Cannot>This browser cannot make the phone buzz.</Cannot>
      )}
      {hasVoice ? (
        <SwitchKey
          title="Read marks aloud"
          hint="With a voice of this phone, so also without signal."
          on={speak}
          onChange={(on) => setHand('speak', on)}
        />
      ) : (
        <Cannot>This phone has no English voice of its own to read marks aloud.</Cannot>
      )}
      <p>
        {canKeepAwake()
          ? 'The screen stays awake while you read a comb.'
          : 'This browser cannot keep the screen awake. Set the phone’s own sleep time to 10 minutes or more.'}
      </p>
    </Part>
  );
}
