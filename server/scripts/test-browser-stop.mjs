/** Jest's global tear-down of the browser's tests. */
export default async function tearDown() {
  await globalThis.rowcallBrowserServer?.stop();
}
