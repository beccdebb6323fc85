/** Answer of `GET /api/me`: who is signed in, and the names a phone needs with no signal. */
export interface MeResponse {
  user: { id: string; name: string };
  team: { id: string; name: string; zone: string };
  role: 'technician' | 'reviewer' | 'biologist' | 'coordinator' | 'researcher';
  /** Everyone whose name may stand beside a record of the team. */
  members: { id: string; name: string }[];
  serverTime: string;
}
