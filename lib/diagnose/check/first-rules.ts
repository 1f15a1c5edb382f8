import type { NextCheck, Run } from '@/shared';
import type { SocketIndex } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { listWords } from '../../layout/words';
import { labelOf } from '../timeline';
import type { Verdict, Weighed } from '../verdict';
import { asNextCheck, weighSeen } from './candidate';
import { minutes } from './costs';
import type { Desk } from './desk';
import { shows } from './likelihoods';
import { voltsWords } from '../supply';
import { railsLabel } from './shared-checks';
import type { State } from './states';

/** A check without a table: it protects the parts, or there is nothing to weigh yet. */
function plain(check: Pick<NextCheck, 'action' | 'label' | 'minutes'> & Partial<NextCheck>): NextCheck {
  return { sockets: [], bits: 0, outcomes: [], ...check };
}

/** The supply before anything else. */
export function supplyChecks({ findings: { index }, rails }: Weighed): NextCheck[] {
  const socket = 0 as SocketIndex;
  const wrong = rails.findLast((rail) => !rail.good);
  const measure = plain({
    action: 'rails',
    label: railsLabel(index, socket),
    sockets: [labelOf(index, socket)],
    minutes: minutes.rails,
    outcomes: [
      { sees: 'a rail out of its limits', means: 'put the supply right before any chip is moved', probability: 0.6 },
      { sees: 'all rails right', means: 'type them in, and the chips are weighed again', probability: 0.4 },
    ],
  });
  if (!wrong) return [measure];
  const { name, limits } = wrong;
  const between = `between ${voltsWords(limits[0])} and ${voltsWords(limits[1])}`;
  return [
    plain({
      action: 'rails',
      label: `Power off, put ${name} right, and measure it at the sockets with the chips out. Then fit them and test all of the memory: some may be hurt.`,
      sockets: [wrong.socket],
      minutes: minutes.repairSupply,
      outcomes: [
        { sees: `${name} ${between}`, means: 'fit the chips and test all of the memory', probability: 0.8 },
        { sees: 'still wrong with the chips out', means: 'the supply or its wiring, no chip', probability: 0.2 },
      ],
    }),
  ];
}

/** Nothing names a lane, and the board does nothing: what comes before any memory. */
export function deadChecks(index: LayoutIndex): NextCheck[] {
  const socket = 0 as SocketIndex;
  return [
    plain({
      action: 'rails',
      label: railsLabel(index, socket),
      sockets: [labelOf(index, socket)],
      minutes: minutes.rails,
    }),
    plain({ action: 'probe', label: 'Look at reset and clock with a scope.', minutes: minutes.probe }),
    plain({ action: 'feel', label: 'Feel for a chip that is much hotter than its neighbours.', minutes: minutes.feel }),
  ];
}

/** The test once more, where the evidence fits nothing. */
export function runAgain(): NextCheck {
  return plain({
    action: 'read-again',
    label: 'Switch off and on, run the test again, and type in what it reports now.',
    minutes: minutes.readAgain,
  });
}

/** A new failure right after handling: the handling is looked at before any part. */
export function refitCheck({ sockets: named }: Verdict, runs: readonly Run[]): NextCheck {
  const handled = (runs.at(-1)?.changes ?? []).flatMap((change) =>
    change.kind === 'swap' ? change.sockets : [change.socket],
  );
  const sockets = [...new Set([...named, ...handled])];
  return plain({
    action: 'reseat',
    label: `Power off at once, look at every leg in ${listWords(sockets)} for a bent one or a chip turned round, refit, and run again.`,
    sockets,
    minutes: minutes.refit,
  });
}

/** It went away: no repair until hours have passed, cold and warm. */
export function soakCheck(desk: Desk): NextCheck {
  const { beliefs, index, verdict, runs, report } = desk;
  const swapped = runs.at(-1)?.changes.findLast((change) => change.kind === 'swap');
  const sockets = verdict.sockets.length > 0 ? verdict.sockets : (swapped?.sockets ?? []);
  const clean = sockets.length > 0 ? `Clean the legs and contacts of ${listWords(sockets)}, then l` : 'L';
  const back = swapped ? ` If it stays away, swap ${listWords(swapped.sockets)} back and run again.` : '';
  const returns = (state: State | null) => {
    if (!state) return shows.returnsOther;
    if (state.sort === 'contact') return shows.returnsContact;
    return state.lanes.length === 0 ? 0 : shows.returnsComesAndGoes;
  };
  const leading = beliefs.states.find(({ lanes, sort }) => sort === 'chip' && lanes.length > 0);
  const chipReturns = leading ? report(leading.lanes) : '';
  const elsewhere = leading !== undefined && chipReturns !== report(beliefs.failed);
  const isLeading = (state: State | null) => state !== null && state.part === leading?.part;
  const quiet = {
    sees: 'no failure in eight hours',
    means: 'at 95\u00a0% it is rarer than once in 2.7 hours; the contact is the likeliest, and is clean now',
    given: (state: State | null) => 1 - returns(state),
  };
  const chip = {
    sees: `it comes back as ${chipReturns}`,
    means: chipMeans(index, leading),
    given: (state: State | null) => (isLeading(state) ? returns(state) : 0),
  };
  const back2 = {
    sees: elsewhere ? `it comes back as ${report(beliefs.failed)}` : 'it comes back',
    means: elsewhere ? 'the contact or the trace of the place, not the chip' : 'type it in as a new run',
    given: (state: State | null) => (elsewhere && isLeading(state) ? 0 : returns(state)),
  };
  return asNextCheck(
    beliefs,
    weighSeen(
      beliefs,
      {
        action: 'soak',
        label: `${clean}et the test run for eight hours, cold and warm, and flex the board gently.${back}`,
        sockets,
        minutes: minutes.soak,
      },
      elsewhere ? [quiet, chip, back2] : [quiet, back2],
    ),
  );
}

function chipMeans(index: LayoutIndex, leading: State | undefined): string {
  const socket = leading?.part.socket ?? null;
  return socket === null
    ? 'a chip that comes and goes'
    : `the chip that is now in ${labelOf(index, socket)} comes and goes`;
}

/** A chip of a family that the socket's supply destroys: the right one in its place, rails first. */
export function wrongPartWords({ beliefs, index }: Desk, socket: SocketIndex): string | null {
  const wrong = beliefs.states.find(({ cause, part }) => cause.mode === 'wrong-part' && part.socket === socket);
  if (!wrong || (beliefs.answers[wrong.answer]?.share ?? 0) < 0.5) return null;
  return rightPartWords(index, socket);
}

/** What is done where a chip does not belong in its socket. */
export function rightPartWords(index: LayoutIndex, socket: SocketIndex): string {
  const family = index.familyOfSocket[socket]?.name ?? 'chip of the right family';
  return `Power off, take out ${labelOf(index, socket)}, measure the rails at the socket, then fit a ${family}.`;
}

/** Whether a place is so surely at fault that a swap has nothing left to tell. */
export function provenPlace({ places }: Weighed, from: number): string | null {
  const [first] = places;
  return first && first.chip >= from ? first.socket : null;
}
