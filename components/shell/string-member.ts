/** The text a JSON answer holds under a name; null when it is no object or holds something else there. */
export function stringMember(answer: unknown, name: string): string | null {
  if (typeof answer !== 'object' || answer === null || !Object.hasOwn(answer, name)) return null;
  const value: unknown = Reflect.get(answer, name);
  return typeof value === 'string' ? value : null;
}
