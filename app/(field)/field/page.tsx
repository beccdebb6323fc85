import { FieldApp } from '@/components/field/field-app';

/** One document for every inner path, made at build time: anything dynamic would end the promise to open offline. */
export const dynamic = 'error';

export default function FieldPage() {
  return <FieldApp />;
}
