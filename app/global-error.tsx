'use client';

import type { ReactElement } from 'react';
import { Failure } from '@/components/shell/failure';
import './globals.css';

interface GlobalErrorProps {
  error: unknown;
  retry: () => void;
}

/** The frame itself failed: a page of its own, without the product's faces of type. */
export default function GlobalError({ error, retry }: GlobalErrorProps): ReactElement {
  return (
    <html lang="en">
      <body>
        <main className="p-6">
          <Failure error={error} onRetry={retry} />
        </main>
      </body>
    </html>
  );
}
