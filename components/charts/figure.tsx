'use client';

import { type ReactElement, type RefObject, useRef, useState } from 'react';
import { saveFile } from '@/components/ui/save-file';
import { figureFile, pngOf } from './figure-file';
import { type FigureName, figureFileName } from './figure-name';
import { useBoxWidth } from './use-box-width';

/** What a figure's file is called and says below the drawing. */
export interface FigureFacts extends FigureName {
  caption: readonly string[];
}

interface DownloadsProps {
  /** The box that holds the drawing. */
  within: RefObject<HTMLElement | null>;
  facts: FigureFacts;
}

type Standing = 'ready' | 'making' | 'failed';

/** Hands the drawing inside a box to the person as a file. */
function useDownload({ within, facts }: DownloadsProps) {
  const [standing, setStanding] = useState<Standing>('ready');
  const download = async (type: 'svg' | 'png'): Promise<void> => {
    const drawing = within.current?.querySelector<SVGSVGElement>('svg.fig-svg, svg.comb-grid');
    if (!drawing || standing === 'making') return;
    setStanding('making');
    try {
      const file = await figureFile(drawing, facts.caption);
      const blob = type === 'svg' ? new Blob([file.text], { type: 'image/svg+xml' }) : await pngOf(file);
      saveFile(blob, figureFileName(facts, type));
      setStanding('ready');
    } catch {
      setStanding('failed');
    }
  };
  return { standing, download };
}

/** Takes a drawing home: as lines (SVG) or as pixels (PNG). */
export function FigureDownloads(props: DownloadsProps): ReactElement {
  const { standing, download } = useDownload(props);
  const { figure } = props.facts;
  const look = 'min-h-6 font-bold text-main underline underline-offset-4';
  return (
    <p className="print-hidden mt-1 flex flex-wrap items-center gap-x-4 text-sm">
      <span className="text-quiet">Download</span>
      {(['svg', 'png'] as const).map((type) => (
        <button
          key={type}
          type="button"
          aria-label={`Download ${figure.replaceAll('-', ' ')} as ${type.toUpperCase()}`}
          onClick={() => void download(type)}
          className={look}
        >
          {type.toUpperCase()}
        </button>
      ))}
      <span role="status">
        {standing === 'making' && 'Making the file …'}
        {standing === 'failed' && 'This browser could not make the file.'}
      </span>
    </p>
  );
}

interface FigureProps {
  /** What the figure shows, in words. */
  label: string;
  facts: FigureFacts;
  /** Draws for a width in CSS pixels. */
  draw: (width: number) => ReactElement | null;
}

/** A drawing that fits its box with letters at their size, and can be taken home. */
export function Figure({ label, facts, draw }: FigureProps): ReactElement {
  const { box, width } = useBoxWidth();
  const frame = useRef<HTMLElement>(null);
  return (
    <figure ref={frame} className="min-w-0">
      <div ref={box} role="img" aria-label={label} className="fig-box">
        {draw(width)}
      </div>
      <FigureDownloads within={frame} facts={facts} />
    </figure>
  );
}
