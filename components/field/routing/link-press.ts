import { FIELD_ROOT } from './field-route';

/** What matters of a click on a link when deciding who follows it. */
export interface LinkPress {
  /** The absolute address the link points to. */
  href: string;
  /** Origin of the page. */
  origin: string;
  /** Mouse button; 0 is the main one. */
  button: number;
  /** A modifier key is held: the person wants a new tab or a download. */
  modified: boolean;
  /** The link names a target frame or a download of its own. */
  elsewhere: boolean;
}

/**
 * The inner path to show when a link is pressed, or null when the browser should follow it itself.
 * Links within the field app never load a document, so they work with the server gone.
 */
export function innerTarget({ href, origin, button, modified, elsewhere }: LinkPress): string | null {
  if (button !== 0 || modified || elsewhere) return null;
  const url = new URL(href, origin);
  if (url.origin !== origin) return null;
  const inside = url.pathname === FIELD_ROOT || url.pathname.startsWith(`${FIELD_ROOT}/`);
  return inside ? url.pathname : null;
}
