import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';

/** What to settle before going near a nest. The programme's rules and local law come first. */
export function NearNestCard(): ReactElement {
  return (
    <Notice tone="warn" title="Before you go near">
      <ul className="ml-5 list-disc">
        <li>She can sting if the nest is touched. Keep other people 3 m away.</li>
        <li>Who had a reaction beyond the sting itself, ever, does not come near.</li>
        <li>Nobody on a ladder alone. No reading on a ladder: come down first.</li>
        <li>Overhead wires within 3 m, spray seen or smelt, lightning, rain: stop the visit.</li>
        <li>No written yes of the owner, no permit, or a species that may be introduced: stop the visit.</li>
      </ul>
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
