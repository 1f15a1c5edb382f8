import { cpSync, existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { readFile, writeFile } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';
import { generateSW } from 'workbox-build';

/** Files whose name carries the hash of their content, which never change. */
const hashed = /[.-][0-9a-f]{32}\./;

/** Kept inside the export, under a name that is never served: files of this build and of those before, newest first. */
const generationsFile = '.builds.json';

/** Builds whose hashed files stay, this one included: a page that was opened before still asks for its own. */
const keptBuilds = 4;

const worthTwins = /\.(html|js|css|json|svg|ttf|webmanifest)$/;

const filesOf = (folder) =>
  readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => relative(folder, join(entry.parentPath, entry.name)))
    .sort();

/** What every page needs but the page's text does not name: the fonts, and the code of what stands around each page. */
const preloads = (files) => [
  ...files.filter((file) => file.endsWith('.ttf')).map((file) => ({ file, as: 'font', crossorigin: true })),
  ...files.filter((file) => /\/_layout-[0-9a-f]{32}\.js$/.test(file)).map((file) => ({ file, as: 'script' })),
];

const addPreloads = (folder, files) => {
  const page = join(folder, 'index.html');
  const links = preloads(files).map(
    ({ file, as, crossorigin }) =>
      `<link rel="preload" href="/${encodeURI(file)}" as="${as}"${crossorigin ? ' crossorigin' : ''} />`,
  );
  writeFileSync(page, readFileSync(page, 'utf8').replace('</head>', `${links.join('')}</head>`));
};

/**
 * The service worker: it keeps the whole application, and nothing of the API, whose boards the application keeps
 * itself. A new one waits until the page tells it to take over.
 */
const addServiceWorker = async (folder) => {
  const { count, warnings } = await generateSW({
    globDirectory: folder,
    globPatterns: ['index.html', 'manifest.webmanifest', 'icons/*', '_expo/static/**/*.{js,css}', 'assets/**/*.ttf'],
    // Without this, nothing under a folder called node_modules, where Expo puts the fonts.
    globIgnores: [],
    // The greatest file is the engine's, far below this; one that is left out would be missing without a network.
    maximumFileSizeToCacheInBytes: 8_000_000,
    dontCacheBustURLsMatching: hashed,
    swDest: join(folder, 'sw.js'),
    mode: 'production',
    sourcemap: false,
    inlineWorkboxRuntime: true,
    skipWaiting: false,
    clientsClaim: true,
    cleanupOutdatedCaches: true,
    navigateFallback: '/index.html',
    navigateFallbackDenylist: [/^\/(api|dev)(\/|$)/],
  });
  if (warnings.length > 0 || count === 0) throw new Error(`The service worker is not whole: ${warnings.join(' ')}`);
};

/** Copies the hashed files of the builds before this one, so that pages which still run find them. */
const carryOver = ({ folder, before, files }) => {
  const known = before && existsSync(join(before, generationsFile));
  const earlier = known ? JSON.parse(readFileSync(join(before, generationsFile), 'utf8')) : [];
  const own = files.filter((file) => hashed.test(file));
  const same = ([first]) => first !== undefined && first.join() === own.join();
  const builds = [own, ...(same(earlier) ? earlier.slice(1) : earlier)].slice(0, keptBuilds);
  for (const file of new Set(builds.slice(1).flat())) {
    for (const path of ['', '.br', '.gz'].map((ending) => `${file}${ending}`)) {
      if (existsSync(join(folder, path)) || !existsSync(join(before, path))) continue;
      mkdirSync(dirname(join(folder, path)), { recursive: true });
      cpSync(join(before, path), join(folder, path));
    }
  }
  writeFileSync(join(folder, generationsFile), JSON.stringify(builds));
};

const squeeze = {
  br: (bytes) =>
    promisify(brotliCompress)(bytes, {
      params: {
        [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY,
        [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length,
      },
    }),
  gz: (bytes) => promisify(gzip)(bytes, { level: constants.Z_BEST_COMPRESSION }),
};

/** Lays a Brotli and a gzip twin beside a file, where they are smaller. */
const addTwins = async (folder, file) => {
  const path = join(folder, file);
  const bytes = await readFile(path);
  for (const [ending, squeezed] of Object.entries(squeeze)) {
    if (existsSync(`${path}.${ending}`)) continue;
    const twin = await squeezed(bytes);
    if (twin.length < statSync(path).size) await writeFile(`${path}.${ending}`, twin);
  }
};

/**
 * Finishes a web export in place: preloads, the service worker, the hashed files of earlier builds, and compressed
 * twins of every text, so that the server compresses nothing at the time of asking.
 */
export const finishExport = async (folder, before) => {
  const files = filesOf(folder);
  addPreloads(folder, files);
  await addServiceWorker(folder);
  carryOver({ folder, before, files });
  await Promise.all(
    filesOf(folder)
      .filter((file) => worthTwins.test(file) && !file.startsWith('.'))
      .map((file) => addTwins(folder, file)),
  );
};

const [, script, folder, before] = process.argv;
if (script === import.meta.filename && folder !== undefined) await finishExport(folder, before);
