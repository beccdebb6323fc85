const DAY_MS = 86_400_000;

/** The wall-clock fields of an instant in a time zone. */
interface LocalParts {
  date: string;
  time: string;
}

const formatters = new Map<string, Intl.DateTimeFormat>();

/** One formatter a zone: making one costs far more than using it. */
function formatterFor(zone: string): Intl.DateTimeFormat {
  const known = formatters.get(zone);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-CA', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  formatters.set(zone, made);
  return made;
}

/**
 * The local date (`YYYY-MM-DD`) and time (`HH:MM`) of an instant.
 *
 * @param epochMs the instant in milliseconds.
 * @param zone an IANA zone such as `America/New_York`.
 */
export function localParts(epochMs: number, zone: string): LocalParts {
  const parts: Partial<Record<Intl.DateTimeFormatPartTypes, string>> = {};
  for (const { type, value } of formatterFor(zone).formatToParts(epochMs)) parts[type] = value;
  return {
    date: `${parts.year}-${parts.month}-${parts.day}`,
    time: `${parts.hour}:${parts.minute}`,
  };
}

/** The local date (`YYYY-MM-DD`) of an instant in a zone. */
export function localDate(epochMs: number, zone: string): string {
  return localParts(epochMs, zone).date;
}

/** Adds whole days to a `YYYY-MM-DD` date. */
export function addDays(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * DAY_MS).toISOString().slice(0, 10);
}

/** Whole days from one `YYYY-MM-DD` date to another; negative when `to` is earlier. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / DAY_MS);
}

/** Is `zone` a time zone this platform knows? */
export function isTimeZone(zone: string): boolean {
  try {
    formatterFor(zone);
    return true;
  } catch {
    return false;
  }
}
