import 'server-only';
import type { Person } from '@/lib/server/demo/story/person';

/** Technician of the second team. */
export const YSOLDE: Person = { email: 'technician@ossle.example', name: 'Ysolde Carrack', role: 'technician' };

/** Reviewer of the second team. */
export const BRAM: Person = { email: 'reviewer@ossle.example', name: 'Bram Otterveld', role: 'reviewer' };

/** Coordinator of the second team. */
const NOEMI: Person = { email: 'coordinator@ossle.example', name: 'Noemi Laszkar', role: 'coordinator' };

/** Everyone of the second team. */
export const OSSLE_PEOPLE: readonly Person[] = [YSOLDE, BRAM, NOEMI];
