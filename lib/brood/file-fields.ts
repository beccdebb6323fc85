import { type Result, err, ok } from '@/lib/kit/result';

/** A member of a file that cannot be read; the message names it. */
export class FieldError extends Error {
  constructor(
    readonly field: string,
    problem: string,
  ) {
    super(`${field}: ${problem}`);
    this.name = 'FieldError';
  }
}

/** An object out of a file whose members have not been looked at yet. */
export type Fields = Readonly<Record<string, unknown>>;

function kindOf(value: unknown): string {
  if (value === undefined) return 'missing';
  if (value === null) return 'null';
  return Array.isArray(value) ? 'a list' : `a ${typeof value}`;
}

/** Reads an object. @throws FieldError */
export function readObject(value: unknown, field: string): Fields {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw new FieldError(field, `must be an object, is ${kindOf(value)}`);
  }
  return value as Fields;
}

/** Reads a list, item by item. @throws FieldError */
export function readList<T>(value: unknown, field: string, readItem: (item: unknown, field: string) => T): T[] {
  if (!Array.isArray(value)) throw new FieldError(field, `must be a list, is ${kindOf(value)}`);
  return value.map((item, i) => readItem(item, `${field}[${i}]`));
}

/** Reads a text that is not empty. @throws FieldError */
export function readText(value: unknown, field: string): string {
  if (typeof value !== 'string') throw new FieldError(field, `must be a text, is ${kindOf(value)}`);
  if (value.trim() === '') throw new FieldError(field, 'must not be empty');
  return value;
}

/** Reads a finite number within bounds. @throws FieldError */
export function readNumber(value: unknown, field: string, bounds: { min?: number; max?: number } = {}): number {
  if (typeof value !== 'number' || !Number.isFinite(value))
    throw new FieldError(field, `must be a number, is ${kindOf(value)}`);
  const { min = -Infinity, max = Infinity } = bounds;
  if (value < min || value > max) throw new FieldError(field, `must be between ${min} and ${max}, is ${value}`);
  return value;
}

/** Reads a whole number within bounds. @throws FieldError */
export function readWhole(value: unknown, field: string, bounds: { min?: number; max?: number } = {}): number {
  const number = readNumber(value, field, bounds);
  if (!Number.isInteger(number)) throw new FieldError(field, `must be a whole number, is ${number}`);
  return number;
}

/** Reads true or false; a missing member is false. @throws FieldError */
export function readFlag(value: unknown, field: string): boolean {
  if (value === undefined || value === null) return false;
  if (typeof value !== 'boolean') throw new FieldError(field, `must be true or false, is ${kindOf(value)}`);
  return value;
}

/**
 * Parses a JSON text and reads it with `read`.
 *
 * @returns what was read, or one line that names the member that cannot be.
 */
export function readJsonFile<T>(text: string, read: (value: unknown) => T): Result<T, string> {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    return err(`file: not JSON (${error instanceof Error ? error.message.replaceAll('\n', ' ') : 'unreadable'})`);
  }
  try {
    return ok(read(value));
  } catch (error) {
    if (error instanceof FieldError) return err(error.message);
    throw error;
  }
}
