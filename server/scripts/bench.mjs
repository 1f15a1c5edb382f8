import { startNode } from './setup/children.mjs';
import { ensureMawk } from './setup/debian.mjs';
import { ensurePackages } from './setup/packages.mjs';
import { GiveUp, giveUp, say } from './setup/say.mjs';

/** What can be measured, each in a process of its own, so that no part warms up or slows down another. */
const parts = {
  'look-up': 'look-up.ts',
  diagnose: 'diagnose.ts',
  logs: 'logs.ts',
  layouts: 'layouts.mjs',
  'first-load': 'first-load.mjs',
};

/** Runs a part; TypeScript is compiled once, when the part is loaded. */
const rowsOf = async (part) => {
  const child = startNode(['--import', 'tsx', `server/scripts/bench/${parts[part]}`], { env: process.env });
  let rows;
  child.child.on('message', (message) => {
    rows = message.rows;
  });
  const code = await child.ended;
  if (code !== 0 || rows === undefined) throw new GiveUp(`the measurement of ${part} failed; the reason is above.`);
  return rows;
};

const digits = (value) => (value >= 1000 ? 0 : value >= 100 ? 1 : 2);

const figure = (value, unit) =>
  `${value.toLocaleString('en', { minimumFractionDigits: digits(value), maximumFractionDigits: digits(value) })} ${unit}`;

/** A row as text: the figure, the target, and the figure as a multiple of the target. */
const cells = ({ what, value, unit, target }) => {
  if (target === undefined) return [what, figure(value, unit), '', ''];
  const bound = target.atLeast ?? target.atMost;
  const words = target.atLeast === undefined ? 'at most' : 'at least';
  return [what, figure(value, unit), `${words} ${figure(bound, unit)}`, `${(value / bound).toFixed(2)} of it`];
};

const table = (rows) => {
  const lines = [['What', 'Measured', 'Target', ''], ...rows.map(cells)];
  const widths = [0, 1, 2].map((column) => Math.max(...lines.map((line) => line[column].length)));
  return lines
    .map(([what, measured, target, share]) =>
      `${what.padEnd(widths[0])}  ${measured.padStart(widths[1])}  ${target.padEnd(widths[2])}  ${share}`.trimEnd(),
    )
    .join('\n');
};

try {
  const wanted = process.argv.slice(2);
  const unknown = wanted.filter((part) => !(part in parts));
  if (unknown.length > 0) {
    throw new GiveUp(`${unknown.join(', ')} cannot be measured. There are: ${Object.keys(parts).join(', ')}.`);
  }
  await ensurePackages();
  const rows = [];
  const chosen = wanted.length > 0 ? wanted : Object.keys(parts);
  if (chosen.includes('logs')) await ensureMawk();
  for (const part of chosen) rows.push(...(await rowsOf(part)));
  say(table(rows));
} catch (error) {
  giveUp(error);
}
