import { afterAll, beforeAll } from 'vitest';
import { type TestDatabase, createTestDatabase } from './database';

/** Vitest set-up: the file's tests get a migrated, empty database of their own, which `database()` then opens. */
let own: TestDatabase | undefined;

beforeAll(async () => {
  own = await createTestDatabase();
  process.env.DB_NAME = own.name;
});

afterAll(async () => {
  await globalThis.undereaveSequelize?.close();
  await own?.drop();
});
