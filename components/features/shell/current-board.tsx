import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';

/** The board that the page is about, as shown in the header. */
export type CurrentBoard = { name: string; slug: string };

const Current = createContext<CurrentBoard | null>(null);
const SetCurrent = createContext<(board: CurrentBoard | null) => void>(() => undefined);

/** Holds the board of the page for the header above it. */
export function CurrentBoardProvider({ children }: { children: ReactNode }) {
  const [board, setBoard] = useState<CurrentBoard | null>(null);
  return (
    <SetCurrent.Provider value={setBoard}>
      <Current.Provider value={board}>{children}</Current.Provider>
    </SetCurrent.Provider>
  );
}

/** The board to show in the header, or null. */
export function useBoardInHeader(): CurrentBoard | null {
  return useContext(Current);
}

/** Shows a board in the header for as long as the calling screen is there. Null while it is not known yet. */
export function useShowBoardInHeader(name: string | null, slug: string): void {
  const setBoard = useContext(SetCurrent);
  const board = useMemo(() => (name === null ? null : { name, slug }), [name, slug]);
  useEffect(() => {
    setBoard(board);
    return () => setBoard(null);
  }, [board, setBoard]);
}
