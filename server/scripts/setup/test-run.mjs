/** Jest's projects. */
const projects = ['lib', 'shared', 'published', 'server', 'browser', 'ui'];

/**
 * Projects that a run with these arguments may touch: those it selects, or those its paths lie in, or all.
 * @param {string[]} args
 * @returns {string[]}
 */
export const projectsOf = (args) => {
  const at = args.indexOf('--selectProjects');
  if (at >= 0) {
    const names = args.slice(at + 1);
    const end = names.findIndex((name) => name.startsWith('-'));
    return projects.filter((name) => (end < 0 ? names : names.slice(0, end)).includes(name));
  }
  const paths = args.filter((arg) => /(^|\/)tests\//.test(arg));
  return paths.length ? projects.filter((name) => paths.some((path) => path.includes(`tests/${name}/`))) : projects;
};

/**
 * The closing line of a run.
 * @param {{ passed: number, failed: number, skipped: number }} counts
 */
export const closingLine = ({ passed, failed, skipped }) =>
  `Rowcall: ${passed} passed, ${failed} failed${skipped ? `, ${skipped} skipped` : ''}`;
