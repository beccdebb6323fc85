import 'server-only';
import type { ExportQuery } from './export-query';

/** One download. */
export interface ExportRequest {
  /** As it stands in the address; anything may have been typed there. */
  file: string;
  query: ExportQuery;
  requestId: string;
  /** Epoch milliseconds. */
  nowMs: number;
}
