/** Answer of `POST /api/sync/v1/enrol`. */
export interface EnrolResponse {
  deviceId: string;
  /** Secret that locks this user's unsent work on a shared phone. */
  deviceKey: string;
  epoch: number;
  schema: number;
  serverTime: string;
}

/** Answer of `POST /api/sync/v1/have`. */
export interface HaveResponse {
  protocol: number;
  epoch: number;
  serverTime: string;
  have: string[];
}
