/** Jest's global tear-down of the server's tests. */
export default async function tearDown() {
  await globalThis.rowcallTestDatabase?.stop();
}
