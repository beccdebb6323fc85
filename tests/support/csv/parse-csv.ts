/**
 * Reads CSV after RFC 4180, written apart from the product's writer so that each checks the other.
 * A leading byte order mark is not data, a final line break is not a record, and a quote inside an unquoted field,
 * or text after a closing quote, is an error.
 */
export function parseCsv(text: string): string[][] {
  const source = text.startsWith('\ufeff') ? text.slice(1) : text;
  const records: string[][] = [];
  let at = 0;
  while (at < source.length) {
    const record: string[] = [];
    for (;;) {
      const { value, next } = readField(source, at);
      record.push(value);
      at = next;
      if (source[at] !== ',') break;
      at += 1;
    }
    records.push(record);
    at = afterBreak(source, at);
  }
  return records;
}

function afterBreak(source: string, at: number): number {
  if (at >= source.length) return at;
  if (source.startsWith('\r\n', at)) return at + 2;
  throw new Error(`expected CRLF at ${at}, found ${JSON.stringify(source.slice(at, at + 5))}`);
}

function readField(source: string, at: number): { value: string; next: number } {
  if (source[at] !== '"') {
    const [value = ''] = /^[^",\r\n]*/.exec(source.slice(at)) ?? [];
    if (source[at + value.length] === '"') throw new Error(`quote inside an unquoted field at ${at}`);
    return { value, next: at + value.length };
  }
  let value = '';
  for (let i = at + 1; i < source.length; i++) {
    if (source[i] !== '"') value += source[i];
    else if (source[i + 1] === '"') value += source[i++];
    else return { value, next: i + 1 };
  }
  throw new Error('a quoted field never ends');
}

/** The rows of a file as objects by header, with every record as wide as the header. */
export function csvObjects(text: string): Record<string, string>[] {
  const [header = [], ...records] = parseCsv(text);
  return records.map((record) => {
    if (record.length !== header.length)
      throw new Error(`a record has ${record.length} fields, the header ${header.length}`);
    return Object.fromEntries(header.map((name, index) => [name, record[index] ?? '']));
  });
}
