'use client';

import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { monthWords } from '@/components/ui/month-words';
import { Notice } from '@/components/ui/notice';
import { requestDraw } from './draw-request';

/** A key for each month that can be drawn. */
export function DrawKeys({ months }: { months: readonly string[] }): ReactElement | null {
  const router = useRouter();
  const { mutate, isPending, data } = useMutation({
    mutationFn: (month: string) => requestDraw(month, fetch),
    onSuccess: (trouble) => {
      if (trouble === null) router.refresh();
    },
  });
  if (months.length === 0) return null;
  return (
    <div className="print-hidden mb-4">
      <p className="mb-2">
        Of every month that is over, one in ten is read by another reader and one in twenty by the same.
      </p>
      <div className="flex flex-wrap gap-2">
        {months.map((month) => (
          <Button key={month} disabled={isPending} onClick={() => mutate(month)}>
            Draw {monthWords(month)}
          </Button>
        ))}
      </div>
      {data && (
        <Notice tone="stop" live="assertive" className="mt-3">
          <p>{data}</p>
        </Notice>
      )}
    </div>
  );
}
