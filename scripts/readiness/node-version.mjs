// @ts-check

/**
 * A sentence when this version of Node cannot run Leeboard, otherwise null. The oldest versions are those that the
 * test and lint programs ask for.
 * @param {string} version as in process.versions.node
 * @returns {string | null}
 */
export function nodeVersionFault(version) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  if ((major === 20 && minor >= 19) || (major === 22 && minor >= 13) || major >= 23) return null;
  return `Leeboard needs Node 20.19, 22.13 or a later version; this is Node ${version}. Install one of these and run the command again.`;
}
