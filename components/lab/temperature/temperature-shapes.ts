import type { HeatWarning } from '@/lib/brood/temperature/clock-parts';
import type { FileNote } from '@/lib/brood/temperature/csv/file-note';
import type { FileLayout, FileQuestion } from '@/lib/brood/temperature/csv/layout';
import type { DaySummary } from '@/lib/brood/temperature/day-summary';

/** A file or list of days that was kept. Instants are ISO texts. */
export interface KeptView {
  id: string;
  kind: 'logger' | 'daily';
  source: 'file' | 'hand';
  fileName: string | null;
  size: number;
  from: string;
  to: string;
  keptBy: string;
  keptAt: string;
  removed: { by: string; at: string; reason: string } | null;
}

/** What the page knows of a nest's temperature. */
export interface TemperatureView {
  kind: 'logger' | 'daily' | 'none';
  zone: string;
  limitC: number;
  referenceC: number;
  days: readonly DaySummary[];
  warnings: readonly HeatWarning[];
  records: readonly KeptView[];
}

/** What a file was recognised as. */
export type PreviewView =
  | { kind: 'unreadable'; reason: string }
  | { kind: 'questions'; questions: readonly FileQuestion[] }
  | {
      kind: 'read';
      layout: FileLayout;
      count: number;
      from: string;
      to: string;
      lowest: number;
      highest: number;
      gaps: number;
      notes: readonly FileNote[];
      noteCounts: Partial<Record<FileNote['code'], number>>;
      warnings: readonly string[];
    };
