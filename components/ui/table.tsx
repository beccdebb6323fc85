import type { ComponentPropsWithoutRef, ReactElement, ReactNode } from 'react';

interface TableProps {
  /** What the table holds; read out before it. */
  caption: string;
  /** Give the box its own Tab stop, so that a table without links can be scrolled by keyboard. */
  scrolls?: boolean;
  className?: string;
  children: ReactNode;
}

/** A dense table that scrolls sideways inside itself when a narrow page can't hold it. */
export function Table({ caption, scrolls = false, className = '', children }: TableProps): ReactElement {
  return (
    <div
      className="overflow-x-auto print:overflow-visible"
      {...(scrolls && { role: 'group', 'aria-label': caption, tabIndex: 0 })}
    >
      <table className={`w-full border-collapse text-left ${className}`}>
        <caption className="sr-only">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

/** A column's heading. */
export function HeadCell({ className = '', ...rest }: ComponentPropsWithoutRef<'th'>): ReactElement {
  return (
    <th
      scope="col"
      className={`border-b-2 border-ink px-2 py-1.5 align-bottom font-bold first:pl-0 ${className}`}
      {...rest}
    />
  );
}

/** A cell of the body; `number` sets figures right-aligned in the mono face. */
export function BodyCell({ number = false, className = '', ...rest }: BodyCellProps): ReactElement {
  return (
    <td
      className={`border-b border-rule px-2 py-1 align-top first:pl-0 ${number ? 'text-right font-mono' : ''} ${className}`}
      {...rest}
    />
  );
}

interface BodyCellProps extends ComponentPropsWithoutRef<'td'> {
  number?: boolean;
}
