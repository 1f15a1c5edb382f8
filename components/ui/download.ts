/** Hands a text to the browser as a file to be saved. */
export function downloadText({ name, text, type }: { name: string; text: string; type: string }): void {
  const address = URL.createObjectURL(new Blob([text], { type }));
  const anchor = document.createElement('a');
  anchor.href = address;
  anchor.download = name;
  anchor.click();
  // The browser has taken hold of the text by then; kept longer, it would stay in memory until the page is closed.
  setTimeout(() => URL.revokeObjectURL(address), 0);
}
