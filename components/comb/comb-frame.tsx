import type { ReactElement, ReactNode } from 'react';

interface CombFrameProps {
  mirrored: boolean;
  className?: string;
  children: ReactNode;
}

/** The labels every comb carries: where 12 is, and from which side it is seen. */
export function CombFrame({ mirrored, className = '', children }: CombFrameProps): ReactElement {
  return (
    <div className={`comb-frame ${className}`}>
      <p className="comb-label text-center">
        <span aria-hidden="true">▲ </span>12<span className="sr-only"> is at the top</span>
      </p>
      {children}
      <p className="comb-label">{mirrored ? 'from above, mirrored' : 'from below'}</p>
    </div>
  );
}
