import { authRoute } from '@/lib/server/auth/auth-route';

export const dynamic = 'force-dynamic';

export {
  authRoute as GET,
  authRoute as HEAD,
  authRoute as POST,
  authRoute as PUT,
  authRoute as PATCH,
  authRoute as DELETE,
  authRoute as OPTIONS,
};
