import type { ReactElement } from 'react';
import { PageTitle } from '@/components/ui/page-title';
import { NestCode } from './nest-code';
import { TaxonName } from './taxon-name';

interface NestTitleProps {
  code: string;
  name: string | null;
  taxon: string | null;
}

/** A nest's name, code and species as the title of its page. */
export function NestTitle({ code, name, taxon }: NestTitleProps): ReactElement {
  return (
    <PageTitle under={<TaxonName>{taxon}</TaxonName>}>
      {name ?? 'No name'} <NestCode>{code}</NestCode>
    </PageTitle>
  );
}
