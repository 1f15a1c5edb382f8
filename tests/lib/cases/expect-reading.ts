import type { Diagnosis } from '@/shared';
import type { ExpectedCheck, ExpectedReading } from './bench-case';
import { isListed, isNamed, leaders, leadingCount, sentencesOf } from './leaders';

type Check = Diagnosis['nextChecks'][number];

function isAskedFor({ action, sockets, label, outcomes }: Check, wanted: ExpectedCheck): boolean {
  const handled = wanted.sockets ?? [];
  return (
    wanted.actions.includes(action) &&
    handled.every((socket) => sockets.includes(socket)) &&
    (action !== 'swap' || handled.length !== 2 || sockets.length === 2) &&
    (wanted.says ?? []).every((says) => says.test(label)) &&
    (wanted.sees === undefined || outcomes.some(({ sees }) => wanted.sees!.test(sees)))
  );
}

function leadingProblems(answer: Diagnosis, expected: ExpectedReading): string[] {
  const order = leaders(answer);
  const top = expected.top ?? [];
  const first = order.slice(0, top.length);
  const put = order.slice(0, leadingCount(answer, top.length));
  const got = order
    .slice(0, Math.max(4, put.length))
    .map(({ id, share }) => `${id} ${share.toFixed(3)}`)
    .join(', ');
  const missing = top.filter((name) => !first.some((leader) => isNamed(leader, name)));
  const wrong = (expected.mustNotLead ?? []).filter((name) => put.some((leader) => isNamed(leader, name)));
  return [
    ...(missing.length > 0 ? [`does not lead: ${missing.join(', ')}; leading: ${got}`] : []),
    ...(expected.top?.length === 0 && order.length > 0 ? [`nothing should lead; leading: ${got}`] : []),
    ...(wrong.length > 0 ? [`must not lead: ${wrong.join(', ')}; leading: ${got}`] : []),
    ...sharesProblems(answer, expected),
  ];
}

function sharesProblems(answer: Diagnosis, { together, top }: ExpectedReading): string[] {
  if (together === undefined) return [];
  const shares = leaders(answer)
    .slice(0, top?.length)
    .map(({ share }) => share);
  const sum = shares.reduce((total, share) => total + share, 0);
  const fits = sum >= together.holds && shares.every((share) => share <= together.eachAtMost);
  return fits ? [] : [`the leading set holds ${shares.map((share) => share.toFixed(3)).join(' + ')}`];
}

function checkProblems({ nextChecks }: Diagnosis, checks: readonly ExpectedCheck[]): string[] {
  const shown = ({ action, label, outcomes }: Check) =>
    `${action}: ${label} [${outcomes.map(({ sees }) => sees).join(' | ')}]`;
  return checks.flatMap((wanted, at) => {
    const among = at === 0 ? nextChecks.slice(0, 1) : nextChecks;
    if (among.some((check) => isAskedFor(check, wanted))) return [];
    const asked = `${wanted.actions.join('/')} ${(wanted.sockets ?? []).join(' ')} ${(wanted.says ?? []).join(' ')} ${wanted.sees ?? ''}`;
    return [
      `${at === 0 ? 'the first check is not' : 'no check is'} ${asked.trim()}; checks: ${nextChecks.map(shown).join(' // ') || 'none'}`,
    ];
  });
}

function detailProblems(answer: Diagnosis, { detail, signature }: ExpectedReading): string[] {
  const problems: string[] = [];
  if (detail !== undefined) {
    const word = answer.evidence.flatMap(({ words }) => words)[0];
    const differs = Object.entries(detail).filter(([key, value]) => word?.[key as keyof typeof detail] !== value);
    if (differs.length > 0) problems.push(`the first reading leads to ${JSON.stringify(word)}`);
  }
  if (signature !== undefined) {
    const fits = answer.signatures.some((found) =>
      Object.entries(signature).every(([key, value]) => found[key as keyof typeof found] === value),
    );
    if (!fits) problems.push(`no signature ${JSON.stringify(signature)}; found ${JSON.stringify(answer.signatures)}`);
  }
  return problems;
}

/** Everything in which an answer differs from the reading that a case expects; empty where it is that reading. */
export function readingProblems(answer: Diagnosis, expected: ExpectedReading): string[] {
  const text = sentencesOf(answer);
  const listed = (name: string | RegExp) => (typeof name === 'string' ? isListed(answer, name) : name.test(text));
  const unlisted = (expected.alsoListed ?? []).filter((name) => !listed(name));
  const unpaired = (expected.pairs ?? []).filter(
    (pair) => !answer.pairs.some(({ parts }) => pair.every((part) => parts.includes(part))),
  );
  const unsaid = (expected.says ?? []).filter((says) => !says.test(text));
  return [
    ...answer.evidence.flatMap(({ ok, text: typed, reason }) => (ok ? [] : [`"${typed}" is not read: ${reason}`])),
    ...(expected.outcome?.includes(answer.outcome) === false ? [`the outcome is ${answer.outcome}`] : []),
    ...leadingProblems(answer, expected),
    ...(unlisted.length > 0 ? [`not listed: ${unlisted.join(', ')}`] : []),
    ...(unpaired.length > 0 ? [`no pair: ${unpaired.map((pair) => pair.join(' with ')).join(', ')}`] : []),
    ...(expected.sure.includes(answer.sure)
      ? []
      : [`it says ${answer.sure} (${answer.probability}), not ${expected.sure.join(' or ')}`]),
    ...checkProblems(answer, expected.checks ?? []),
    ...(unsaid.length > 0
      ? [`not said: ${unsaid.join(', ')}; said: ${answer.headline} ${answer.sentences.join(' ')}`]
      : []),
    ...detailProblems(answer, expected),
  ];
}
