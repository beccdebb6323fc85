import type { ReactElement } from 'react';

/** The cautions every page carries. */
export function CautionsLine(): ReactElement {
  return (
    <footer className="mt-14 border-t border-rule">
      <div className="mx-auto max-w-page px-4 py-4 text-sm text-quiet sm:px-6">
        <p className="max-w-[60rem]">
          Stings can kill, also at the first reaction: your own plan and local medical direction rule. Ladders, power
          lines, traffic and sprayed nests end a visit. Law, permits and the landowner’s yes come first; introduced or
          unknown species are not moved. Every date of brood is an estimate with a range.
        </p>
      </div>
    </footer>
  );
}
