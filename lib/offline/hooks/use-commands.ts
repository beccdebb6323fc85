'use client';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Place } from '@/lib/offline/nest-view';
export interface Commands {
  openNest(input: { code: string; name?: string | null; taxon?: string | null; place?: Place | null }): Promise<string>;
  openVisit(input: { nest: string; purpose: 'take-down' | 'check' | 'lab' | 'other' }): Promise<string>;
  openReading(input: { nest: string; visit: string; kind: 'field' | 'second'; source: 'phone' | 'paper' | 'photo'; aid?: string | null; light?: string | null }): Promise<string>;
  setField(input: { nest: string; visit?: string | null; reading?: string | null; entity: 'nest' | 'visit' | 'reading'; field: string; value: Json; base: string | null }): Promise<void>;
  setNote(input: { nest: string; visit?: string | null; reading?: string | null; entity: 'nest' | 'visit' | 'reading'; text: string; base: string | null }): Promise<void>;
}
/** Opens nests, visits and readings and sets fields. Each resolves with the new id when the transaction has completed, and rejects with `NotSavedError` (lib/offline/not-saved) otherwise. Null while no session is open. */
export declare function useCommands(): Commands | null;
