import { useEffect } from 'react';

/** Names the page in the browser's tab and history: "Sign in, Rowcall". */
export function useDocumentTitle(title: string): void {
  useEffect(() => {
    document.title = title === '' ? 'Rowcall' : `${title} · Rowcall`;
  }, [title]);
}
