import type { ReactElement } from 'react';
import { LoadingLines } from '@/components/ui/loading-lines';

/** While a lab page is being made. */
export default function LabLoading(): ReactElement {
  return <LoadingLines what="Page" lines={6} />;
}
