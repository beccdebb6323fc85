import { type OwnSignal, createSignal } from '@/lib/offline/signal';

/** How this phone behaves in the hand. It belongs to the phone, not to a person, and says nothing about one. */
export interface HandSettings {
  /** The dim green screen for dusk. */
  lamp: boolean;
  /** Rows of keys mirrored for the left thumb. */
  left: boolean;
  /** A short buzz for every press that is kept, a longer one for one that is not. */
  buzz: boolean;
  /** The last mark read aloud. */
  speak: boolean;
  /** The hint about installing has been put away. */
  hintSeen: boolean;
}

/** A name of a setting that is on or off. */
export type HandSwitch = keyof HandSettings;

/** What a phone starts with. */
export const HAND_DEFAULTS: HandSettings = { lamp: false, left: false, buzz: true, speak: false, hintSeen: false };

/** Where the settings are kept; `HAND_SCRIPT` reads it before anything is drawn. */
const KEY = 'undereave-hand';

/**
 * Runs before the first drawing: by low lamp the page must not flash white. Without quotes and angles, because React
 * would write those as entities, which a script does not understand.
 */
export const HAND_SCRIPT = `try{if(JSON.parse(localStorage[\`${KEY}\`]).lamp)document.documentElement.dataset.lamp=\`low\`}catch{}`;

/** Reads settings from stored text; whatever is not a yes or no falls back to the default. */
export function parseHandSettings(text: string | null): HandSettings {
  const settings = { ...HAND_DEFAULTS };
  try {
    const stored: unknown = JSON.parse(text ?? '{}');
    if (typeof stored !== 'object' || stored === null) return settings;
    for (const [name, value] of Object.entries(stored)) {
      if (name in settings && typeof value === 'boolean') settings[name as HandSwitch] = value;
    }
  } catch {
    // Not our text: the defaults hold.
  }
  return settings;
}

let signal: OwnSignal<HandSettings> | null = null;

function stored(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return null;
  }
}

/** The settings of this phone, the same in every tab. Only in the browser. */
export function handSignal(): OwnSignal<HandSettings> {
  if (signal) return signal;
  const own = createSignal(parseHandSettings(stored()));
  window.addEventListener('storage', (event) => {
    if (event.key === KEY) own.set(parseHandSettings(event.newValue));
  });
  signal = own;
  return own;
}

/** Turns one setting on or off, now and after a restart where the browser keeps anything at all. */
export function setHand(name: HandSwitch, on: boolean): void {
  const own = handSignal();
  const settings = { ...own.get(), [name]: on };
  own.set(settings);
  try {
    localStorage.setItem(KEY, JSON.stringify(settings));
  } catch {
    // A full phone keeps the setting until the page is closed.
  }
}
