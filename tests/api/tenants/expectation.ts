import type { Role } from '@/lib/server/auth/role';
import type { MethodHandlers } from '@/lib/server/http/methods';
import type { ApiCall } from '@/tests/support/factories/call-api';
import type { TestMember } from '@/tests/support/factories/make-team';
import type { Tenant } from './two-teams';

/** A method of a route. */
export type Method = keyof MethodHandlers;

/** Who asks, and in which of the two teams. */
export interface Asker {
  member: TestMember;
  tenant: Tenant;
  /** The other team, whose things the asker may know by id only. */
  other: Tenant;
}

/** A request and the status it gets from somebody who may. */
export interface ExpectedCall {
  name: string;
  call: ApiCall;
  status: number;
}

/** What one method of a route is expected to do. */
export interface MethodExpectation {
  /** Who may; everybody else gets 403 `role`. `public` asks for no session at all. */
  may: readonly Role[] | 'public';
  /** About things of the asker's own team. */
  own(asker: Asker): ExpectedCall[] | Promise<ExpectedCall[]>;
  /**
   * The same request about a thing that only the other team has and about one that nobody has: both get the same
   * answer, byte for byte but for the ids asked for.
   */
  pairs?(asker: Asker): { name: string; foreign: ApiCall; unknown: ApiCall; status: number }[];
}

/** What one route file is expected to do; a method without an expectation answers 405. */
export interface RouteExpectation {
  /** Imports it; the module's members are the handlers by method. */
  load(): Promise<object>;
  methods: Partial<Record<Method, MethodExpectation>>;
  /** Set for a file that answers every method the same way. */
  otherwise?: number;
}
