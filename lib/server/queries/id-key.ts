import 'server-only';

/** A stored id as a map key; cheaper to make than its UUID text. */
export function idKey(id: Buffer): string {
  return id.toString('hex');
}
