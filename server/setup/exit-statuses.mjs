/** Every way in which `npm start` and its commands end, in one place. 0 is a stop that was asked for. */
export const exitStatuses = /** @type {const} */ ({
  unexpected: 1,
  wrongSetting: 2,
  missingRight: 3,
  takenPort: 4,
  database: 5,
  build: 6,
  packages: 7,
  alreadyRunning: 8,
  serverKeepsFailing: 9,
  nodeVersion: 10,
});
