/** "No answer" is a value: why there is none, in words for the person who asked. */
export type Result<T> = ({ readonly ok: true } & T) | { readonly ok: false; readonly reason: string };
