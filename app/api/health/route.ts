import { healthReport } from '@/lib/server/http/health-report';
import { methods } from '@/lib/server/http/methods';
import { API_HEADERS } from '@/lib/server/http/problem';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = methods({
  GET: async () => {
    const report = await healthReport();
    return Response.json(report, { status: report.ok ? 200 : 503, headers: API_HEADERS });
  },
});
