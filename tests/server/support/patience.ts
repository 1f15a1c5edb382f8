// A first query waits for the schema, and other work may share the machine.
jest.setTimeout(30_000);
