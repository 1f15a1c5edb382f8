import type { FaultMode } from '@/shared';
import { bankIndex } from '../brand';
import { channelsOf, servedLanes } from '../layout/served-lanes';
import { bankWords } from '../layout/words';
import { twoKinds, type Builder, type Cause, type Part } from './cause-types';
import type { Scope } from './scopes';

/** The shared parts that the layout lists, as a whole and channel by channel. */
export function sharedParts(builder: Builder): Part[] {
  const { index, priors, scopes } = builder;
  return index.document.sharedParts.flatMap((part) => {
    const served = servedLanes(index, part);
    if (served.length === 0) return [];
    const channels = channelsOf(index, part);
    const bits = part.role === 'multiplexer' ? part.serves.addressBits : undefined;
    const causes: Cause[] = [
      {
        mode: 'whole',
        where: null,
        kinds: twoKinds(builder, priors.sharedWhole, scopes.of(served)),
        ...(bits ? { addressBits: bits } : {}),
      },
    ];
    if (channels.length > 1) {
      for (const channel of channels) {
        causes.push({
          mode: 'channel',
          where: channel.name,
          // An output of a multiplexer carries two address bits, one after the other.
          kinds: twoKinds(
            builder,
            priors.sharedChannel / (channel.addressBit === undefined ? 1 : 2),
            scopes.of(channel.lanes),
          ),
          ...(channel.addressBit === undefined ? {} : { addressBits: [channel.addressBit] }),
        });
      }
    }
    const words = part.name ?? part.role.replace('-', ' ');
    return [
      {
        kind: 'shared-part' as const,
        id: `shared:${part.label}`,
        label: `${part.label} (${words})`,
        socket: null,
        cameFrom: null,
        sharedPart: part.label,
        causes,
      },
    ];
  });
}

/**
 * A layout seldom lists everything that serves more than one lane. What it leaves out is still there on the
 * board: each data line, each bank and the board as a whole has something shared behind it, so that chips
 * are not blamed for want of another name.
 */
export function unlistedParts(builder: Builder): Part[] {
  const { index, priors, scopes } = builder;
  const listed = new Set<Scope>();
  for (const part of index.document.sharedParts) {
    const served = servedLanes(index, part);
    if (served.length > 0) listed.add(scopes.of(served));
    for (const channel of channelsOf(index, part)) listed.add(scopes.of(channel.lanes));
  }
  const parts: Part[] = [];
  const add = (id: string, label: string, { scope, prior, mode }: { scope: Scope; prior: number; mode: FaultMode }) => {
    if ((listed.has(scope) && mode !== 'channel') || scope.lanes.length < 2) return;
    listed.add(scope);
    const causes = [{ mode, where: null, kinds: twoKinds(builder, prior, scope) }];
    parts.push({ kind: 'shared-part', id, label, socket: null, cameFrom: null, sharedPart: null, causes });
  };
  const whole = { prior: priors.sharedWhole, mode: 'whole' as const };
  add('unlisted:all', 'something that all banks share (supply, strobes, address lines)', {
    scope: scopes.all(),
    ...whole,
  });
  index.document.memory.banks.forEach((bank, b) => {
    const label = `what selects ${bankWords(bank.id)} (strobe, decoder, its supply)`;
    add(`unlisted:bank:${bank.id}`, label, { scope: scopes.ofBank(bankIndex(b)), ...whole });
  });
  for (let line = 0; line < index.lineCount; line++) {
    // Beside a listed driver there is still the line itself, which can be shorted to a supply.
    const scope = scopes.ofLine(line);
    const driven = listed.has(scope);
    const label = `data line ${index.lineName(line)} (${driven ? 'trace, shorted to a supply' : 'trace, buffer'})`;
    add(`unlisted:line:${line}`, label, {
      scope,
      prior: driven ? priors.lineItself : priors.sharedChannel,
      mode: 'channel',
    });
  }
  return parts;
}

/**
 * Each address input of the chips: what brings it there serves row and column one after the other. Listed only where
 * the readings show that address bits are lost, and where no shared part is known to carry them alone.
 */
export function addressLineParts(builder: Builder): Part[] {
  const { index, priors, scopes } = builder;
  const { multiplexing } = index.document;
  if (!multiplexing) return [];
  const inputs = Math.max(multiplexing.row.length, multiplexing.column.length);
  const listed = new Set(
    index.document.sharedParts.flatMap((part) => (part.role === 'multiplexer' ? (part.serves.addressBits ?? []) : [])),
  );
  return Array.from({ length: inputs }, (_, n) => n).flatMap((n): Part[] => {
    const addressBits = [multiplexing.row[n], multiplexing.column[n]].filter((bit) => bit !== undefined);
    if (addressBits.every((bit) => listed.has(bit))) return [];
    const kinds = twoKinds(builder, priors.addressLine, scopes.all());
    return [
      {
        kind: 'shared-part',
        id: `unlisted:address:${n}`,
        label: `address line ${n} of the chips (trace, resistor, multiplexer output)`,
        socket: null,
        cameFrom: null,
        sharedPart: null,
        causes: [{ mode: 'channel', where: null, kinds, addressBits }],
      },
    ];
  });
}

/** Shorts between data lines of one set: neighbours by number, or those that readings point at. */
export function shortParts(builder: Builder, pairs: readonly (readonly [number, number])[]): Part[] {
  const { index, priors, scopes } = builder;
  return pairs.flatMap(([line, other]): Part[] => {
    const lanes = [...scopes.ofLine(line).lanes, ...scopes.ofLine(other).lanes];
    if (scopes.ofLine(line).lanes.length === 0 || scopes.ofLine(other).lanes.length === 0) return [];
    const neighbours = other === line + 1;
    const kinds = twoKinds(builder, neighbours ? priors.lineShort : priors.farShort, scopes.of(lanes));
    return [
      {
        kind: 'short',
        id: `short:${line}-${other}`,
        label: `short between data lines ${index.lineName(line)} and ${index.lineName(other)}`,
        socket: null,
        cameFrom: null,
        sharedPart: null,
        causes: [{ mode: 'short', where: null, lines: [line, other], kinds }],
      },
    ];
  });
}

/** The same parts, with a joint inside each listed buffer between lines that the readings show to be joined. */
export function withJoinedChannels(
  builder: Builder,
  parts: readonly Part[],
  pairs: readonly (readonly [number, number])[],
): readonly Part[] {
  const { index, priors, scopes } = builder;
  return parts.map((part) => {
    const listed = index.document.sharedParts.find(({ label }) => label === part.sharedPart);
    if (!listed || (listed.role !== 'data-buffer' && listed.role !== 'shift-register')) return part;
    const served = new Set(servedLanes(index, listed).map((lane) => index.lineOfLane[lane]));
    const joined = pairs.filter((pair) => pair.every((line) => served.has(line)));
    if (joined.length === 0) return part;
    const causes = joined.map(([line, other]): Cause => {
      const scope = scopes.of([...scopes.ofLine(line).lanes, ...scopes.ofLine(other).lanes]);
      const where = `${index.lineName(line)} and ${index.lineName(other)}`;
      return { mode: 'short', where, lines: [line, other], kinds: twoKinds(builder, priors.shortInside, scope) };
    });
    return { ...part, causes: [...part.causes, ...causes] };
  });
}
