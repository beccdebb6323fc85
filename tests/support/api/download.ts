import * as exportRoute from '@/app/api/export/[file]/route';
import { callApi } from '@/tests/support/factories/call-api';
import type { TestMember } from '@/tests/support/factories/make-team';

/** `GET /api/export/<file>`. */
export function exportFile(as: TestMember | null, file: string, query = ''): Promise<Response> {
  return callApi(exportRoute, 'GET', { as, params: { file }, query });
}

/** The text of a file that can be downloaded, a byte order mark included. */
export async function downloaded(as: TestMember, file: string, query = ''): Promise<string> {
  const response = await exportFile(as, file, query);
  if (response.status !== 200) throw new Error(`expected a file, got ${response.status} ${await response.text()}`);
  return new TextDecoder('utf-8', { ignoreBOM: true, fatal: true }).decode(await response.arrayBuffer());
}
