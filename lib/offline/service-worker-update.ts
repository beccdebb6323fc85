/** Whether a newer version of the app waits on this phone. */
export interface ServiceWorkerUpdate {
  /** A new version is stored and waits for the person's press. */
  offered: boolean;
  /** Switches to it and reloads. Does nothing when none waits. */
  update(): void;
}
