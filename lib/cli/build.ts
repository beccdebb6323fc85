import { buildApplication } from './build-application';
import { runCommand } from './run-command';

/** `npm run build` builds the application and its service worker when the sources have changed. */
await runCommand(async (context) => {
  await buildApplication(context);
  return { code: 0 };
});
