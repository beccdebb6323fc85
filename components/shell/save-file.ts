/** Some browsers read the file only after the press has ended, so its address lives on for a minute. */
const KEEP_MS = 60_000;

/** Hands a file to the person: the browser keeps it among the downloads. Works with no signal. */
export function saveFile(file: Blob, name: string): void {
  const address = URL.createObjectURL(file);
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), KEEP_MS);
}
