import 'server-only';
import { v7 } from 'uuid';

/** A fresh UUIDv7 text for a row that the server makes itself. */
export function newId(): string {
  return v7();
}
