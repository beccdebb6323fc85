import { useQuery } from '@tanstack/react-query';
import { addressWith } from '@/components/lab/list-query';
import type { DownloadFilter } from '@/components/lab/download-files';

/** Rows by file name; null while they are being counted. */
export interface RowCounts {
  rows: Readonly<Record<string, number>> | null;
  isTroubled: boolean;
}

async function countRows(filter: DownloadFilter): Promise<Record<string, number>> {
  const answer = await fetch(addressWith('/api/export/counts', { ...filter }));
  if (!answer.ok) throw new Error(`counting answered ${answer.status}`);
  return ((await answer.json()) as { rows: Record<string, number> }).rows;
}

/** Asks the office how many rows each file will have under a filter. */
export function useRowCounts(filter: DownloadFilter): RowCounts {
  const { data, isError } = useQuery({
    queryKey: ['export-counts', filter],
    queryFn: () => countRows(filter),
    retry: false,
  });
  return { rows: data ?? null, isTroubled: isError };
}
