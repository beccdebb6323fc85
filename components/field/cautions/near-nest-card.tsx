import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';

/** What to settle before going near a nest. The programme's rules and local law come first. */
export function NearNestCard(): ReactElement {
  return (
    <Notice tone="warn" title="Before you go near">
      <p>She can sting if the nest is touched. Keep other people 3 m away. No reading on a ladder.</p>
      <Disclosure size="field" summary="When to stop the visit" className="mt-2">
        <ul className="ml-5 list-disc">
          <li>Somebody here, you too, has had a reaction beyond the sting itself, or is not sure.</li>
          <li>You would be on a ladder alone, or have no way to call for help.</li>
          <li>Overhead wires within 3 m. Traffic you cannot keep off.</li>
          <li>Spray seen, smelt or told of in the last week.</li>
          <li>Lightning, rain, strong wind.</li>
          <li>No written yes of the owner, or a permit is missing.</li>
          <li>A species that is or may be introduced, or unknown. It is not moved.</li>
        </ul>
      </Disclosure>
      <p className="mt-2 text-quiet">
        Your programme’s stop rules, local law and medical direction come before this list.
      </p>
    </Notice>
  );
}

/** Said before every reading, because the fall is the worse injury. */
export function ComeDownCard(): ReactElement {
  return (
    <Notice tone="warn" title="Come down first">
      <p>Both feet on the ground before you read. If she flies at you, walk away: the app keeps your place.</p>
    </Notice>
  );
}
