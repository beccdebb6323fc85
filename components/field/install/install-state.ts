import { type OwnSignal, type Signal, createSignal } from '@/lib/offline/signal';

/**
 * How the app can come to the home screen of this phone. `installed`: it is there and open. `prompt`: the browser asks
 * when told to. `safari`: only by the share menu. `menu`: perhaps by the browser's own menu.
 */
export type InstallState = 'installed' | 'prompt' | 'safari' | 'menu';

/** What of the browser decides that. */
export interface InstallFacts {
  standalone: boolean;
  canPrompt: boolean;
  userAgent: string;
  touchPoints: number;
}

/** Is this one of Apple's phones or tablets? A tablet calls itself a Mac, and has a touch screen all the same. */
function isAppleTouch({ userAgent, touchPoints }: Pick<InstallFacts, 'userAgent' | 'touchPoints'>): boolean {
  return /iPhone|iPad|iPod/.test(userAgent) || (userAgent.includes('Macintosh') && touchPoints > 1);
}

/** The way in for this phone. */
export function installState(facts: InstallFacts): InstallState {
  if (facts.standalone) return 'installed';
  if (facts.canPrompt) return 'prompt';
  return isAppleTouch(facts) ? 'safari' : 'menu';
}

/** The event with which some browsers offer to install; it has to be kept until a person presses a key. */
interface InstallOffer extends Event {
  prompt(): Promise<unknown>;
}

function isOffer(event: Event): event is InstallOffer {
  return 'prompt' in event && typeof event.prompt === 'function';
}

let offer: InstallOffer | null = null;
let signal: OwnSignal<InstallState> | null = null;

function facts(): InstallFacts {
  const standalone =
    matchMedia('(display-mode: standalone)').matches || ('standalone' in navigator && navigator.standalone === true);
  const { userAgent, maxTouchPoints } = navigator;
  return { standalone, canPrompt: offer !== null, userAgent, touchPoints: maxTouchPoints };
}

/** The way in for this phone, as it changes. Only in the browser; the first call begins to listen. */
export function installSignal(): Signal<InstallState> {
  if (signal) return signal;
  const own = createSignal(installState(facts()));
  const look = (): void => own.set(installState(facts()));
  window.addEventListener('beforeinstallprompt', (event) => {
    event.preventDefault();
    offer = isOffer(event) ? event : null;
    look();
  });
  window.addEventListener('appinstalled', () => {
    offer = null;
    own.set('installed');
  });
  signal = own;
  return own;
}

/** Lets the browser ask the person. An offer can be used once. */
export async function promptInstall(): Promise<void> {
  const used = offer;
  offer = null;
  await used?.prompt();
}
