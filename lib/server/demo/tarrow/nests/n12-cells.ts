import 'server-only';
import { readingsFromSheet } from '@/lib/server/demo/build/readings-from-sheet';

/** Columns: cell, q, r, then the state in the field, blind and final reading. */
const SHEET = `
0,0,0,c,c,c     1,0,-1,c,c,c    2,1,-1,c,c,c    3,1,0,c,c,c     4,0,1,c,c,c
5,-1,1,c,c,c    6,-1,0,p,c,p    7,0,-2,l,l,l    8,1,-2,l,l,l    9,2,-2,l,l,l
10,2,-1,l,l,l   11,2,0,l,l,l    12,1,1,l,l,l    13,0,2,m,l,l    14,-1,2,m,m,m
15,-2,2,m,m,m   16,-2,1,m,m,m   17,-2,0,s,m,s   18,-1,-1,s,s,s  19,0,-3,s,s,s
20,1,-3,s,s,s   21,2,-3,s,s,s   22,3,-3,s,s,s   23,3,-2,e,e,e   24,3,-1,e,e,e
25,3,0,e,e,e    26,2,1,e,e,e    27,1,2,e,e,e    28,0,3,e,e,e    29,-1,3,e,e,e
30,-2,3,e,e,e   31,-3,3,e,e,e   32,-3,2,-,e,e
`;

/** N12 to the cell: what Senna read at the bandstand, what Halloran read blind, and what Dr Loos settled. */
export const N12_CELLS = readingsFromSheet(SHEET);
