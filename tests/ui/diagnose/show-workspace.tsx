import { configure } from '@testing-library/react';
import { WorkspaceScreen } from '@/components/features/diagnose/workspace-screen';
import { benchOf, type Bench } from '@/components/features/diagnose/bench';
import type { LayoutDocument } from '@/shared';
import { renderPage } from '../support/render';
import { address } from './live-router';

// Whether each of a thousand nodes is hidden takes jsdom most of a test's time; nothing here is.
configure({ defaultHidden: true });

/** Makes a board ready, or fails the test. */
export function readyBench(document: LayoutDocument): Bench {
  const bench = benchOf(document);
  if (bench === null) throw new Error('The board of the test is none.');
  return bench;
}

/** Shows the workspace of a board at an address. */
export function showWorkspace(document: LayoutDocument, params: Record<string, string> = {}) {
  address.start({ slug: 'board', ...params });
  return renderPage(<WorkspaceScreen bench={readyBench(document)} fromDevice={false} error={null} />);
}
