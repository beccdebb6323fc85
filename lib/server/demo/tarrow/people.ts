import 'server-only';
import type { Person } from '@/lib/server/demo/story/person';

/** Technician; takes down N01, N03 and N11. */
export const TOBIAH: Person = { email: 'technician@tarrow.example', name: 'Tobiah Marsh', role: 'technician' };

/** Technician; takes down N02 and N09, and shares N06. */
export const ORIEL: Person = { email: 'technician2@tarrow.example', name: 'Oriel Webb-Nakada', role: 'technician' };

/** Technician; takes down N12. */
export const SENNA: Person = { email: 'technician3@tarrow.example', name: 'Senna Vautry', role: 'technician' };

/** Second reader of N12. */
export const HALLORAN: Person = { email: 'reviewer@tarrow.example', name: 'Halloran Pike', role: 'reviewer' };

/** Second reader of N02, and reader of N10 in the lab. */
export const JUNO: Person = { email: 'reviewer2@tarrow.example', name: 'Juno Abarra', role: 'reviewer' };

/** Lead biologist: signs the settings and settles what the readers dispute. */
export const LOOS: Person = { email: 'biologist@tarrow.example', name: 'Dr Wystan Loos', role: 'biologist' };

/** Coordinator of the Quillard Field Room. */
export const IMKE: Person = { email: 'coordinator@tarrow.example', name: 'Imke Dolan-Reyes', role: 'coordinator' };

/** Outside researcher; sees places rounded. */
const AMADI: Person = { email: 'researcher@tarrow.example', name: 'Prof. Amadi Corriveau', role: 'researcher' };

/** Everyone of the Trust. */
export const TARROW_PEOPLE: readonly Person[] = [TOBIAH, ORIEL, SENNA, HALLORAN, JUNO, LOOS, IMKE, AMADI];
