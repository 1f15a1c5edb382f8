import { useLocalSearchParams, useRouter } from 'expo-router';
import { useCallback, useEffect, useMemo, useRef } from 'react';
import { rememberLookup } from '@/components/features/lookup/device-boards';
import type { Run } from '@/shared';
import { keptEvidence, workspaceLink } from './link/kept-evidence';
import { fitLink, leftBehind, longestLink } from './link/workspace-link';
import { readStep, writeStep, type Step } from './workspace-step';

/** The part of the link that says what is being typed. */
export interface Draft {
  /** The tab in which it is typed: see entry/entry-tabs.ts. */
  readonly tab: string | null;
  readonly text: string;
}

/** The look-up as its link has it, and how to change it. */
export interface Workspace {
  readonly slug: string;
  readonly runs: readonly Run[];
  /** What of the link could not be read. */
  readonly problems: readonly string[];
  readonly step: Step;
  readonly draft: Draft;
  /** Names of the evidence that is too large for the link and stays on this device. */
  readonly leftBehind: readonly string[];
  /** How the sketch is turned, as text of the link. */
  readonly view: string | null;
  /** Changes whenever something other than what is being typed has changed. */
  readonly revision: string;
  /** Takes new runs over and goes to a step. A place of its own in the browser's history. False: the link would be too long. */
  readonly commit: (runs: readonly Run[], step?: Step, draft?: Draft) => boolean;
  /** Goes to a step without changing anything. `draft`: what is typed there at first. */
  readonly goTo: (step: Step, draft?: Draft) => void;
  /** Keeps what is being typed. No place of its own in the history. */
  readonly keepDraft: (draft: Draft) => void;
  readonly keepView: (view: string | null) => void;
}

/** Time in ms after the last key before the draft goes into the link: browsers refuse too many changes at once. */
const draftPause = 300;

/** Longest draft in characters that the link remembers. */
const longestDraft = 1000;

type Params = { slug: string; r?: string; e?: string; f?: string; d?: string; v?: string };

/** Reads the look-up from the link of the page, and writes it there. */
export function useWorkspace(): Workspace {
  const router = useRouter();
  const params = useLocalSearchParams<Params>();
  const { slug, r = '', e = '', f, d = '', v } = params;
  const { runs, problems } = useMemo(() => workspaceLink.parse(r), [r]);
  const step = useMemo(() => readStep(e, runs), [e, runs]);
  const timer = useRef<ReturnType<typeof setTimeout> | undefined>(undefined);
  useEffect(() => () => clearTimeout(timer.current), [r, e]);
  useEffect(() => {
    if (r !== '' && problems.length === 0) rememberLookup(slug, r);
  }, [slug, r, problems]);

  const go = useCallback(
    (next: { runs: readonly Run[]; step: Step; draft?: Draft }) => {
      clearTimeout(timer.current);
      const link = fitLink(next.runs, keptEvidence);
      if (link.length > longestLink) return false;
      router.push({
        pathname: '/boards/[slug]/diagnose',
        params: withoutEmpty({
          slug,
          r: link,
          e: writeStep(next.step, next.runs),
          f: next.draft === undefined ? f : (next.draft.tab ?? undefined),
          d: next.draft?.text,
          v,
        }),
      });
      // The same page with another step begins at its top.
      requestAnimationFrame(() => window.scrollTo(0, 0));
      return true;
    },
    [router, slug, f, v],
  );
  const commit = useCallback(
    (next: readonly Run[], to: Step = { at: 'answer' }, begun?: Draft) => go({ runs: next, step: to, draft: begun }),
    [go],
  );
  const goTo = useCallback((to: Step, begun?: Draft) => void go({ runs, step: to, draft: begun }), [go, runs]);
  const keepDraft = useCallback(
    (draft: Draft) => {
      clearTimeout(timer.current);
      timer.current = setTimeout(
        () =>
          router.setParams({
            f: draft.tab ?? undefined,
            d: draft.text === '' || draft.text.length > longestDraft ? undefined : draft.text,
          }),
        draftPause,
      );
    },
    [router],
  );
  const keepView = useCallback((view: string | null) => router.setParams({ v: view ?? undefined }), [router]);
  const draft = useMemo(() => ({ tab: f ?? null, text: d }), [f, d]);
  const left = useMemo(() => leftBehind(r), [r]);
  return {
    slug,
    runs,
    problems,
    step,
    draft,
    leftBehind: left,
    view: v ?? null,
    revision: `${r}|${e}`,
    commit,
    goTo,
    keepDraft,
    keepView,
  };
}

const withoutEmpty = <T extends Record<string, string | undefined>>(params: T) =>
  Object.fromEntries(Object.entries(params).filter(([, value]) => value !== undefined && value !== '')) as T;
