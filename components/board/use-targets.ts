import { useRef, useState } from 'react';
import { directions, nearestTo, neighbourOf } from './geometry-nearest';
import type { Point } from './geometry';
import type { ScenePart, SceneSocket, TargetKey } from './geometry-scene';

/** What can be picked on a sketch. */
export type Target = SceneSocket | ScenePart;

type TargetsInput = {
  /** In reading order. */
  targets: readonly Target[];
  chosen: TargetKey | null;
  /** Where the keyboard begins while nothing is chosen. */
  first: Target | null;
  /** How far a finger may miss, sketch units. */
  reach: number;
  idOf: (target: Target) => string;
  placeOf: (event: { clientX: number; clientY: number }) => Point;
  onTap: (target: Target) => void;
  onPick: (target: Target) => void;
  /** The keyboard has moved to it. */
  onReach: (target: Target) => void;
  /** Any other key; true where something was done. */
  onKey: (key: string, active: Target) => boolean;
};

/**
 * One stop of the tab key for all sockets and shared parts: arrow keys go to the nearest in their direction, Home and End
 * to the first and the last, Enter and Space pick; a tap picks what it hits, else what lies nearest within reach.
 */
export function useTargets(input: TargetsInput) {
  const { targets, chosen, first, idOf } = input;
  const pointer = useRef(false);
  const [focus, setFocus] = useState<'none' | 'pointer' | 'keyboard'>('none');
  // Where the keyboard went holds until something else is chosen.
  const [wandered, setWandered] = useState<{ key: TargetKey; under: TargetKey | null } | null>(null);

  const find = (key: TargetKey | null) => (key === null ? undefined : targets.find((target) => target.key === key));
  const active = (wandered?.under === chosen && find(wandered.key)) || find(chosen) || first || targets[0] || null;

  const moveTo = (target: Target | null | undefined) => {
    if (!target) return;
    setWandered({ key: target.key, under: chosen });
    input.onReach(target);
  };
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey || !active) return;
    const direction = directions[event.key as keyof typeof directions];
    if (direction) moveTo(neighbourOf(targets, active, direction));
    else if (event.key === 'Home') moveTo(targets[0]);
    else if (event.key === 'End') moveTo(targets[targets.length - 1]);
    else if (event.key === 'Enter' || event.key === ' ') input.onPick(active);
    else if (!input.onKey(event.key, active)) return;
    setFocus('keyboard');
    event.preventDefault();
  };
  const onClick = (event: React.MouseEvent) => {
    const option = event.target instanceof Element ? event.target.closest('[role="option"]')?.id : undefined;
    const hit = option === undefined ? undefined : targets.find((target) => idOf(target) === option);
    const target = hit ?? nearestTo(targets, input.placeOf(event), input.reach);
    if (target) input.onTap(target);
  };
  const handlers = {
    onKeyDown,
    onClick,
    onMouseDown: () => {
      pointer.current = true;
    },
    onFocus: () => {
      setFocus(pointer.current ? 'pointer' : 'keyboard');
      pointer.current = false;
    },
    onBlur: () => setFocus('none'),
  };
  return { active, focused: focus === 'keyboard' ? (active?.key ?? null) : null, handlers };
}
