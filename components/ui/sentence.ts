/** Words as the start of a sentence: `field reading` → `Field reading`. */
export function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
