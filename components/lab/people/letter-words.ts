/** What became of a letter, in words. */
export function letterWords(standing: string | null, email: string): string {
  switch (standing) {
    case 'sent':
      return `The letter to ${email} is on its way. Its link works for seven days.`;
    case 'kept':
      return `The letter to ${email} is among the letters of this demo. Its link works for seven days.`;
    default:
      return `The invitation of ${email} stands, but the letter did not go out. Send it again below.`;
  }
}
