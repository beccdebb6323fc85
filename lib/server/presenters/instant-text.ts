import 'server-only';

const WITH_OFFSET = /(Z|[+-]\d{2}:?\d{2})$/;

/**
 * A time as people get it: the text a person's phone wrote, with its offset, as long as everybody reads the same
 * instant from it; otherwise the stored instant in UTC.
 */
export function instantText(written: string, stored: Date): string {
  return WITH_OFFSET.test(written) && Date.parse(written) === stored.getTime() ? written : stored.toISOString();
}
