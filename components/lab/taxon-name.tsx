import type { ReactElement } from 'react';

/** A scientific name in italics; *group* and *sp.* stay upright, as printed keys have it. */
export function TaxonName({ children }: { children: string | null }): ReactElement {
  if (!children) return <span className="text-quiet">not named yet</span>;
  const [name = '', rest] = children.split(/ (?=(?:group|sp\.|spp\.)$)/);
  return (
    <span lang="la">
      <i>{name}</i>
      {rest && ` ${rest}`}
    </span>
  );
}
