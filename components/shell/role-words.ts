/** What a role is called. */
export const ROLE_WORDS = {
  technician: 'technician',
  reviewer: 'reviewer',
  biologist: 'lead biologist',
  coordinator: 'coordinator',
  researcher: 'researcher',
} as const;

/** One of the five roles. */
export type RoleName = keyof typeof ROLE_WORDS;

/** What a role that came as plain text is called; the text itself when it is none of ours. */
export function roleWords(role: string): string {
  const words: Readonly<Record<string, string>> = ROLE_WORDS;
  return words[role] ?? role;
}

/** Does this role settle, lock and amend readings? The office decides; pages only spare others the keys. */
export function settles(role: RoleName): boolean {
  return role === 'reviewer' || role === 'biologist';
}

/** Does this role keep temperature records of nests? */
export function recordsTemperature(role: RoleName): boolean {
  return role !== 'researcher';
}

/** Does this role write and sign the settings? */
export function ownsSettings(role: RoleName): boolean {
  return role === 'biologist';
}
