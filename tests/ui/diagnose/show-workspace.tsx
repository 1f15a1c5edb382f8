import { configure } from '@testing-library/react';
import { WorkspaceScreen } from '@/components/features/diagnose/workspace-screen';
import type { LayoutDocument } from '@/shared';
import { renderPage } from '../support/render';
import { address } from './live-router';
import { readyBench } from './ready-bench';

// Whether each of a thousand nodes is hidden takes jsdom most of a test's time; nothing here is.
configure({ defaultHidden: true });

/** Shows the workspace of a board at an address. */
export function showWorkspace(document: LayoutDocument, params: Record<string, string> = {}) {
  address.start({ slug: 'board', ...params });
  return renderPage(<WorkspaceScreen bench={readyBench(document)} fromDevice={false} error={null} />);
}
