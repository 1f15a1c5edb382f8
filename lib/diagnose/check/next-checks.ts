import type { NextCheck, Run } from '@/shared';
import { wentAway } from '../verdict';
import { asNextCheck } from './candidate';
import { candidates, deskFor, ranked, type CheckInput } from './candidates';
import { effort, type Desk } from './desk';
import {
  deadChecks,
  provenPlace,
  refitCheck,
  runAgain,
  soakCheck,
  supplyChecks,
  rightPartWords,
  wrongPartWords,
} from './first-rules';
import { measureCheck, replaceCheck } from './place-checks';
import { railsCheck } from './shared-checks';
import { settleMeaning } from './whole-checks';

/** No more than this many checks are listed. */
const mostListed = 5;
/**
 * From here on a chip is replaced without another check: a repair that helps is the proof, and a swap before it
 * would cost its minutes in nine cases to save a wrong replacement in one.
 */
const provenFrom = 0.9;
/** A check that tells less than this is not listed. */
const leastBits = 0.005;
/** An open meaning of the report is settled first where that tells at least this much. */
const worthSettling = 0.1;

/**
 * What to check next, the best first: the most expected information about the part at fault for the minutes
 * that it takes. Before that come the rules of the trade: the supply before any chip, the handling before any
 * part, the meaning of the report before any socket, a soak after a fault that went away, and a proof by
 * repair where one cheap repair is all but certain (probability over cost, where a repair is likely: D.
 * Heckerman, J. S. Breese, K. Rommelse, Decision-theoretic troubleshooting, 1995; from memory). No inference
 * is made for a candidate: what it would show follows from the states that are already weighed.
 */
export function nextChecks(input: CheckInput): NextCheck[] {
  const { weighed, verdict } = input;
  const { index } = weighed.findings;
  if (verdict.outcome === 'supply') return supplyChecks(weighed);
  if (verdict.outcome === 'no-evidence')
    return weighed.signs.some(({ sign }) => sign === 'dead') ? deadChecks(index) : [];
  if (verdict.outcome === 'not-shown') return [];
  const desk = deskFor(input);
  if (!desk) return [runAgain()];
  const { beliefs } = desk;
  const first = comesFirst(desk);
  // Before it is known what was reported, and right after chips were fitted wrongly, no chip is moved.
  if (verdict.refit || first[0]?.action === 'read-again' || first[0]?.action === 'ask') return first;
  const telling = candidates(desk).filter(({ bits }) => bits >= leastBits);
  const others = ranked(desk, telling)
    .slice(0, mostListed + first.length)
    .map((candidate) => asNextCheck(beliefs, candidate))
    .filter((check) => first.every((each) => each.label !== check.label));
  return followUp(notMadeYet([...first, ...others], desk.runs).slice(0, mostListed));
}

/** Without the checks whose finding is known already. */
function notMadeYet(checks: readonly NextCheck[], runs: readonly Run[]): NextCheck[] {
  const made = new Set(
    runs.flatMap((run) =>
      run.evidence.flatMap((each) => (each.kind === 'finding' ? [`${each.check} ${each.about}`] : [])),
    ),
  );
  if (made.size === 0) return [...checks];
  const known = ({ outcomes }: NextCheck) =>
    outcomes.some(({ finding }) => finding && made.has(`${finding.check} ${finding.about}`));
  return checks.filter((check) => !known(check));
}

/** What the rules of the trade put before the score. */
function comesFirst(desk: Desk): NextCheck[] {
  const { weighed, verdict, beliefs, index } = desk;
  if (wentAway(weighed)) return [soakCheck(desk)];
  if (verdict.refit) return [refitCheck(verdict, desk.runs)];
  if (verdict.outcome === 'unexplained') return [runAgain()];
  const settle = settleMeaning(desk);
  if (settle && settle.bits >= worthSettling) return [asNextCheck(beliefs, settle)];
  if ((verdict.outcome === 'shared' && allFail(desk)) || severalHot(desk)) return railsFirst(desk);
  if (verdict.outcome !== 'place') return [];
  const [breaking] = weighed.breaking.flatMap((label) => index.socketByLabel.get(label) ?? []);
  if (breaking !== undefined) {
    return [asNextCheck(beliefs, replaceCheck(desk, breaking, rightPartWords(index, breaking)))];
  }
  const [place] = weighed.places;
  const socket = place ? index.socketByLabel.get(place.socket) : undefined;
  if (place === undefined || socket === undefined) return [];
  const wrong = wrongPartWords(desk, socket);
  if (wrong !== null) return [asNextCheck(beliefs, replaceCheck(desk, socket, wrong))];
  if (provenPlace(weighed, provenFrom) !== null && effort(index, [socket]) === 1)
    return [asNextCheck(beliefs, replaceCheck(desk, socket))];
  if (place.contact > place.chip) return [asNextCheck(beliefs, measureCheck(desk, socket))];
  return [];
}

/** Every lane failed, other than in a picture, which shows that the supply is there. */
function allFail({ beliefs, index, runs }: Desk): boolean {
  const drawn = runs.some((run) => run.evidence.some((each) => each.kind === 'picture'));
  return !drawn && beliefs.failing.length === index.lanes.length;
}

/** Several chips are hot: over-voltage or a lost rail does that, and more so the longer it is on. */
function severalHot({ weighed: { signs } }: Desk): boolean {
  return new Set(signs.flatMap(({ sign, socket }) => (sign === 'hot' && socket ? [socket] : []))).size > 1;
}

/** The supply before anything else, unless it was measured. */
function railsFirst(desk: Desk): NextCheck[] {
  return desk.weighed.rails.length > 0 ? [] : [asNextCheck(desk.beliefs, railsCheck(desk))];
}

/** A test of the whole is cheap and comes with what follows it. */
function followUp(checks: NextCheck[]): NextCheck[] {
  const [first] = checks;
  const then = checks.find(({ action }) => action === 'swap');
  if (first?.action !== 'test-whole' || !then) return checks;
  const label = `${first.label.slice(0, -1)}, then swap ${then.sockets.join(' with ')}.`;
  return [{ ...first, label }, ...checks.slice(1)];
}
