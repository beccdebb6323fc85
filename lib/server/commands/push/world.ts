import 'server-only';
import type { Role } from '@/lib/server/auth/role';
import type { RegisterSet } from '@/lib/protocol/register';

/** An operation the team already has. */
export interface KnownOp {
  seq: number;
  bodyHash: string;
  kind: string;
  nest: string | null;
  visit: string | null;
  reading: string | null;
  actorId: string;
  /** The register it sets, when it sets one. */
  register: string | null;
}

/** A nest as far as operations care. */
export interface KnownNest {
  archived: boolean;
}

/** A visit as far as operations care. */
export interface KnownVisit {
  nest: string;
  archived: boolean;
}

/** A reading as far as operations care. */
export interface KnownReading {
  nest: string;
  visit: string;
  kind: string;
  openedBy: string;
  submitted: boolean;
  /** Is the final reading made from it locked? */
  locked: boolean;
}

/**
 * What a push needs to know of a team's data: read once inside the transaction, then kept up to date in memory
 * while operations are applied, so that later operations of a batch see earlier ones.
 */
export interface World {
  /** Where the team works; null when unknown. */
  home: { lat: number; lon: number } | null;
  ops: Map<string, KnownOp>;
  nests: Map<string, KnownNest>;
  visits: Map<string, KnownVisit>;
  readings: Map<string, KnownReading>;
  /** Ids of marks that were taken back. */
  retracted: Set<string>;
  /** Registers by key; only those that some operation of this push sets. */
  registers: Map<string, RegisterSet[]>;
}

/** Who sent an operation. */
export interface Actor {
  userId: string;
  role: Role;
}

/** A world without anything in it. */
export function emptyWorld(home: World['home']): World {
  return {
    home,
    ops: new Map(),
    nests: new Map(),
    visits: new Map(),
    readings: new Map(),
    retracted: new Set(),
    registers: new Map(),
  };
}
