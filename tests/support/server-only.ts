// Stands in for the `server-only` marker package under test.
export {};
