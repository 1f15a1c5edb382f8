import type { Lane, SocketIndex } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import type { Priors } from './priors';
import { twoKinds, type Builder, type Cause, type Kind, type Part } from './cause-types';
import { noHints, type Hints } from './hints';
import { Scopes, type Scope } from './scopes';
import { addressLineParts, sharedParts, shortParts, unlistedParts, withJoinedChannels } from './shared-causes';
import { labelOf, type Chip, type Timeline } from './timeline';
import { isDestroyed } from './wrong-part';

const firstRuns = new WeakMap<LayoutIndex, { priors: Priors; parts: readonly Part[] }>();

/** Every cause of the model for this layout, as the chips lay in each run, and those that the readings point at. */
export function listParts(
  index: LayoutIndex,
  timeline: Timeline,
  { priors, hints }: { priors: Priors; hints: Hints },
): readonly Part[] {
  // Nearly every question is about one run on an untouched board: its causes are listed once a layout.
  const untouched = timeline.runCount === 1 && timeline.handled.size === 0;
  const before = untouched ? firstRuns.get(index) : undefined;
  const scopes = scopesOf(index);
  const builder: Builder = { index, timeline, priors, scopes, everyRun: new Map() };
  const parts = before?.priors === priors ? before.parts : listAfresh(builder);
  if (untouched) firstRuns.set(index, { priors, parts });
  if (hints === noHints) return parts;
  const far = hints.joinedLines.filter(([line, other]) => other !== line + 1);
  return [
    ...withJoinedChannels(builder, parts, hints.joinedLines),
    ...(hints.addressLines ? addressLineParts(builder) : []),
    ...shortParts(builder, far),
  ];
}

const scopesByLayout = new WeakMap<LayoutIndex, Scopes>();

function scopesOf(index: LayoutIndex): Scopes {
  let scopes = scopesByLayout.get(index);
  if (!scopes) scopesByLayout.set(index, (scopes = new Scopes(index)));
  return scopes;
}

function listAfresh(builder: Builder): readonly Part[] {
  const { index, timeline } = builder;
  return [
    ...timeline.chips.map((chip) => chipPart(builder, chip)),
    ...index.document.sockets.map((_, socket) => positionPart(builder, socket as SocketIndex)),
    ...sharedParts(builder),
    ...unlistedParts(builder),
    ...shortParts(builder, neighbours(index)),
  ];
}

/** Data lines of one set that follow each other by number. */
function neighbours(index: LayoutIndex): [number, number][] {
  return Array.from({ length: Math.max(0, index.lineCount - 1) }, (_, line): [number, number] => [
    line,
    line + 1,
  ]).filter(([, other]) => other % index.bitCount !== 0);
}

/** The lanes behind each data pin of a socket's chip. */
function pinScopes({ index, scopes }: Builder, socket: SocketIndex): Map<number, Scope> {
  const lanes = new Map<number, Lane[]>();
  for (const held of index.document.sockets[socket]?.holds ?? []) {
    const bank = index.bankByName.get(held.bank);
    if (bank === undefined || held.bit >= index.bitCount) continue;
    const lane = index.laneOf(bank, held.bit as never);
    if (!index.laneExists[lane]) continue;
    const list = lanes.get(held.pin);
    if (!list) lanes.set(held.pin, [lane]);
    else if (!list.includes(lane)) list.push(lane);
  }
  return new Map([...lanes].map(([pin, list]) => [pin, scopes.inSocket(socket, list)]));
}

/** What of the chip priors holds for this chip: by the history of its socket, or because it is known to be good. */
function shareOf(priors: Priors, { quality, cameFrom }: Chip): number {
  if (quality === 'found') return priors.chipFactor?.[cameFrom] ?? 1;
  return quality === 'known-good' ? priors.knownGoodShare : 1;
}

function chipPart(builder: Builder, chip: Chip): Part {
  const { index, priors, scopes } = builder;
  const share = shareOf(priors, chip);
  /** A scope in each run by where the chip is then. */
  const moving = (at: (socket: SocketIndex) => Scope | null): Scope | readonly (Scope | null)[] => {
    if (chip.since === 0 && chip.socketInRun.every((socket) => socket === chip.cameFrom)) {
      const scope = at(chip.cameFrom);
      if (scope) return scope;
    }
    const made = new Map<SocketIndex, Scope | null>();
    return chip.socketInRun.map((socket) => {
      if (socket === null) return null;
      if (!made.has(socket)) made.set(socket, at(socket));
      return made.get(socket) ?? null;
    });
  };
  const home = pinScopes(builder, chip.cameFrom);
  const pins = [...home.keys()].sort((a, b) => a - b);
  const several = pins.length > 1;
  const causes: Cause[] = [];
  const whole = priors.chipDead * share * (several ? 1 - priors.oneDataPinShare : 1);
  if (isDestroyed(index, chip)) {
    const own = moving((at) => scopes.ofSocket(at));
    causes.push({ mode: 'wrong-part', where: null, kinds: twoKinds(builder, priors.wrongPart, own) });
  }
  causes.push({
    mode: 'dead',
    where: null,
    kinds: twoKinds(
      builder,
      whole,
      moving((at) => scopes.ofSocket(at)),
    ),
  });
  for (const pin of several ? pins : []) {
    const prior = (priors.chipDead * share * priors.oneDataPinShare) / pins.length;
    const kinds = twoKinds(
      builder,
      prior,
      moving((at) => pinScopes(builder, at).get(pin) ?? null),
    );
    causes.push({ mode: 'dead-bit', where: `data pin ${pin}`, kinds });
  }
  for (const pin of pins) {
    const prior = (priors.chipHoldsLine * share) / pins.length;
    const lines = (at: SocketIndex) => {
      const own = pinScopes(builder, at).get(pin)?.lanes ?? [];
      const numbers = [...new Set(own.map((lane) => index.lineOfLane[lane] as number))];
      return scopes.of([...new Set(numbers.flatMap((line) => scopes.ofLine(line).lanes))]);
    };
    causes.push({
      mode: 'holds-line',
      where: several ? `data pin ${pin}` : null,
      kinds: twoKinds(builder, prior, moving(lines)),
    });
  }
  const strobe = twoKinds(
    builder,
    priors.chipHoldsStrobe * share,
    moving((at) => scopes.ofBanksOf(at)),
  );
  const address = twoKinds(
    builder,
    priors.chipHoldsAddress * share,
    moving(() => scopes.all()),
  );
  causes.push(
    { mode: 'holds-strobe', where: null, kinds: strobe },
    { mode: 'holds-address', where: null, kinds: address },
  );
  const now = chip.socketInRun.at(-1) ?? null;
  return {
    kind: 'chip',
    id: chip.id,
    label: chipWords(index, chip, now),
    socket: now,
    cameFrom: chip.cameFrom,
    sharedPart: null,
    causes,
  };
}

function chipWords(index: LayoutIndex, chip: Chip, now: SocketIndex | null): string {
  const from = labelOf(index, chip.cameFrom);
  const fitted = chip.quality !== 'found';
  if (now === null) return fitted ? `the chip that was fitted in ${from} for a time` : `the chip taken out of ${from}`;
  if (now === chip.cameFrom) return fitted ? `the chip just fitted in ${from}` : `chip in ${from}`;
  return `chip now in ${labelOf(index, now)} (came from ${from})`;
}

function positionPart(builder: Builder, socket: SocketIndex): Part {
  const { index, priors, scopes } = builder;
  const pins = pinScopes(builder, socket);
  const several = pins.size > 1;
  const whole = priors.positionOpen * (several ? 1 - priors.oneDataPinShare : 1);
  const causes: Cause[] = [
    {
      mode: 'open',
      where: null,
      kinds: contactKinds(builder, socket, { prior: whole, scope: scopes.ofSocket(socket) }),
    },
  ];
  if (several) {
    const prior = (priors.positionOpen * priors.oneDataPinShare) / pins.size;
    for (const [pin, scope] of pins) {
      causes.push({
        mode: 'open-bit',
        where: `data pin ${pin}`,
        kinds: contactKinds(builder, socket, { prior, scope }),
      });
    }
  }
  const fitting = fittingKinds(builder, socket);
  if (fitting.length > 0) causes.push({ mode: 'fitting', where: null, kinds: fitting });
  const label = labelOf(index, socket);
  return {
    kind: 'position',
    id: `position:${label}`,
    label: `socket ${label}, its contacts and traces`,
    socket,
    cameFrom: null,
    sharedPart: null,
    causes,
  };
}

/**
 * An open contact that was there from the start: each time the position is handled it is cured with some
 * chance, so "it went away" does not clear the place.
 */
function contactKinds(
  builder: Builder,
  socket: SocketIndex,
  { prior, scope }: { prior: number; scope: Scope },
): Kind[] {
  const { priors, timeline } = builder;
  const kinds: Kind[] = [];
  let lasting = 1;
  for (const run of timeline.handled.get(socket) ?? []) {
    if (run === 0) continue;
    const until = Array.from({ length: timeline.runCount }, (_, r) => (r < run ? scope : null));
    const cured = twoKinds(builder, prior * lasting * priors.handlingCures, until);
    kinds.push(...cured.map((kind) => ({ ...kind, cured: run })));
    lasting *= 1 - priors.handlingCures;
  }
  return [...twoKinds(builder, prior * lasting, scope), ...kinds];
}

/** A bent leg or a chip turned round, from the time the position was handled until it is handled again. */
function fittingKinds(builder: Builder, socket: SocketIndex): Kind[] {
  const { priors, scopes, timeline } = builder;
  const scope = scopes.ofSocket(socket);
  const handled = timeline.handled.get(socket) ?? [];
  return handled.flatMap((run, i) => {
    const next = handled[i + 1] ?? Infinity;
    const between = Array.from({ length: timeline.runCount }, (_, r) => (r >= run && r < next ? scope : null));
    return twoKinds(builder, priors.handlingHarms, between).map((kind) => ({
      ...kind,
      cured: next === Infinity ? null : next,
    }));
  });
}
