// @ts-check
/** Next, Sequelize's driver and the scripts here were tried on this version and later ones. */
const OLDEST = [20, 9];

/**
 * A sentence when this version of Node cannot run Leeboard, otherwise null.
 * @param {string} version as in process.versions.node
 * @returns {string | null}
 */
export function nodeVersionFault(version) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  const [oldestMajor = 0, oldestMinor = 0] = OLDEST;
  const recentEnough = major > oldestMajor || (major === oldestMajor && minor >= oldestMinor);
  if (recentEnough) return null;
  return `Leeboard needs Node ${OLDEST.join(".")} or later; this is Node ${version}. Install a newer Node and run the command again.`;
}
