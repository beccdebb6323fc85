import type { ReactElement, ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { LinkButton } from '@/components/ui/link-button';
import type { ListQuery } from './list-query';

interface FilterFormProps {
  /** Where the form leads, by GET: the address holds the filter, so it can be bookmarked. */
  path: string;
  query: ListQuery;
  /** The names to offer for the species. */
  taxa: readonly string[];
  /** What the first control asks for, with its own name and value. */
  first: { name: string; label: string; value: string | undefined };
  /** The words on the button. */
  act: string;
  children?: ReactNode;
}

/** Species and dates to narrow a list or a download by; works without script. */
export function FilterForm({ path, query, taxa, first, act, children }: FilterFormProps): ReactElement {
  const isNarrowed = [first.value, query.taxon, query.from, query.to].some((value) => value !== undefined);
  return (
    <form action={path} method="get" role="search" className="print-hidden mb-6 flex flex-wrap items-end gap-3">
      <Field id="filter-first" label={first.label} className="min-w-44 grow sm:max-w-72">
        {(control) => <Input {...control} type="search" name={first.name} defaultValue={first.value} maxLength={200} />}
      </Field>
      <Field id="filter-taxon" label="Species" className="min-w-44 grow sm:max-w-72">
        {(control) => <Input {...control} name="taxon" list="filter-taxa" defaultValue={query.taxon} maxLength={200} />}
      </Field>
      <datalist id="filter-taxa">
        {taxa.map((taxon) => (
          <option key={taxon} value={taxon} />
        ))}
      </datalist>
      <Field id="filter-from" label="Visited from">
        {(control) => <Input {...control} type="date" name="from" defaultValue={query.from} />}
      </Field>
      <Field id="filter-to" label="to, included">
        {(control) => <Input {...control} type="date" name="to" defaultValue={query.to} />}
      </Field>
      {children}
      <Button type="submit" tone="main">
        {act}
      </Button>
      {isNarrowed && (
        <LinkButton href={path} tone="quiet">
          Show all
        </LinkButton>
      )}
    </form>
  );
}
