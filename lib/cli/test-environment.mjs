/** @type {Readonly<Record<string, string>>} */
const DEFAULTS = {
  DATA_DIR: '.data-test',
  DB_PORT: '3327',
  DB_FLUSH: '2',
  PORT: '3100',
  DEMO: '1',
};

/**
 * Gives this process the environment of a test run where nothing else is asked for: its own data folder and ports,
 * so that it never meets the data of `npm start`. (Plain JavaScript because the tools' configurations read it too.)
 *
 * @param {NodeJS.ProcessEnv} env
 */
export function applyTestEnvironment(env = process.env) {
  for (const [name, value] of Object.entries(DEFAULTS)) env[name] ??= value;
}
