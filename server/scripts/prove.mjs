import { startNode } from './setup/children.mjs';
import { ensurePackages } from './setup/packages.mjs';
import { GiveUp, giveUp, say } from './setup/say.mjs';

/** What is proved, each part in a process of its own: its program and what that is told. */
const parts = {
  own: ['singles.ts', 'own'],
  shared: ['singles.ts', 'shared'],
  reports: ['reports.ts'],
  reference: ['reference.ts'],
  search: ['search.ts'],
  follow: ['follow.ts'],
};
const atOnce = 2;

/** --cases N --seed S --only kind. */
const optionsOf = (args) => {
  const known = { '--cases': 'PROVE_CASES', '--seed': 'PROVE_SEED', '--only': 'PROVE_ONLY', '--part': 'PROVE_PART' };
  const options = {};
  for (let at = 0; at < args.length; at += 2) {
    const name = known[args[at]];
    const value = args[at + 1];
    const number = name === 'PROVE_CASES' || name === 'PROVE_SEED';
    if (name === undefined || value === undefined || (number && !/^[1-9]\d*$/.test(value))) {
      throw new GiveUp('Say: npm run prove -- [--cases N] [--seed S] [--only kind] [--part name].');
    }
    options[name] = value;
  }
  return options;
};

const tablesOf = async (part, options) => {
  const [program, ...told] = parts[part];
  const child = startNode(['--import', 'tsx', `server/scripts/prove/${program}`, ...told], {
    env: { ...process.env, ...options },
  });
  let tables;
  child.child.on('message', (message) => {
    tables = message.tables;
  });
  const code = await child.ended;
  if (code !== 0 || tables === undefined) throw new GiveUp(`the proof of ${part} failed; the reason is above.`);
  return tables;
};

/** Tables of one title are one table. */
const together = (tables) => {
  const byTitle = new Map();
  for (const table of tables) {
    const before = byTitle.get(table.title);
    byTitle.set(table.title, before === undefined ? table : { ...before, rows: [...before.rows, ...table.rows] });
  }
  return [...byTitle.values()].filter(({ rows }) => rows.length > 0);
};

const markdown = ({ title, columns, rows, notes = [] }) => {
  const line = (cells) => `| ${cells.join(' | ')} |`;
  const rule = columns.map((_, at) => (at === 0 ? '---' : '--:'));
  return [`### ${title}`, '', line(columns), line(rule), ...rows.map(line), ...notes.map((note) => `\n${note}`)].join(
    '\n',
  );
};

try {
  const args = process.argv.slice(2);
  const options = optionsOf(args);
  const wanted = Object.keys(parts).filter((part) => options.PROVE_PART === undefined || part === options.PROVE_PART);
  if (wanted.length === 0)
    throw new GiveUp(`There is no part ${options.PROVE_PART}. There are: ${Object.keys(parts).join(', ')}.`);
  await ensurePackages();
  const waiting = [...wanted];
  const tables = new Map();
  const worker = async () => {
    for (let part = waiting.shift(); part !== undefined; part = waiting.shift()) {
      tables.set(part, await tablesOf(part, options));
    }
  };
  await Promise.all(Array.from({ length: atOnce }, worker));
  const command = ['npm run prove', ...(args.length > 0 ? ['--', ...args] : [])].join(' ');
  say(`Measured on ${new Date().toISOString().slice(0, 10)} with \`${command}\`.\n`);
  say(
    together(wanted.flatMap((part) => tables.get(part)))
      .map(markdown)
      .join('\n\n'),
  );
} catch (error) {
  giveUp(error);
}
