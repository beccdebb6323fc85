import { notFoundRoute } from '@/lib/server/http/not-found-route';

export const dynamic = 'force-dynamic';

export {
  notFoundRoute as GET,
  notFoundRoute as HEAD,
  notFoundRoute as POST,
  notFoundRoute as PUT,
  notFoundRoute as PATCH,
  notFoundRoute as DELETE,
  notFoundRoute as OPTIONS,
};
