import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';

const CALL =
  'inline-flex min-h-field items-center rounded-xl border-3 border-stop bg-paper px-5 font-bold text-stop no-underline';

/** What to do when somebody was stung. Gives no doses; the person's own plan and local medical direction rule. */
export function StingCard(): ReactElement {
  return (
    <section aria-label="Somebody was stung" className="rounded-xl border-3 border-stop bg-stop-wash p-4">
      <p className="text-xl font-bold text-stop">Somebody was stung</p>
      <p className="mt-1">
        Stop and move away from the nest. Stay with the person.{' '}
        <strong>
          Trouble breathing, swelling away from the sting, hives, faintness or vomiting: call the emergency number now.
        </strong>{' '}
        Have the person lie down and not stand or walk.
      </p>
      <p className="mt-3 flex flex-wrap gap-gap">
        <a href="tel:112" className={CALL}>
          Call 112
        </a>
        <a href="tel:911" className={CALL}>
          Call 911
        </a>
      </p>
      <Disclosure size="field" summary="More" className="mt-3">
        <ul className="ml-5 list-disc">
          <li>Use the emergency number of the place, if it is another one.</li>
          <li>The person’s own emergency plan and local medical direction rule. This app gives no doses.</li>
          <li>A sting can kill at the first reaction. No history is not no risk.</li>
          <li>
            More than about ten stings, or a sting to mouth, eye or neck, or a child, an old or a pregnant person: seek
            care.
          </li>
          <li>Wasps leave no sting in the skin. Do not scrape.</li>
        </ul>
      </Disclosure>
    </section>
  );
}
