import knex, { type Knex } from "knex";
import pg from "pg";
import { env } from "@/lib/env";

// bigint and numeric come back as text by default. Our sizes, lengths and readings all fit a double exactly enough; ids are uuid.
pg.types.setTypeParser(pg.types.builtins.INT8, Number);
pg.types.setTypeParser(pg.types.builtins.NUMERIC, Number);
// A date is a day of the calendar, not a moment: keep it as yyyy-mm-dd, out of reach of time zones.
pg.types.setTypeParser(pg.types.builtins.DATE, (text) => text);

/** A connection pool to `url`, with days counted in UTC as the server's clock does. The caller ends it with `destroy()`. */
export function connect(url: string, poolSize = 10): Knex {
  return knex({ client: "pg", connection: { connectionString: url, options: "-c TimeZone=UTC" }, pool: { min: 0, max: poolSize } });
}

// The development server loads modules anew on every change; one pool must outlive that.
const holder = globalThis as { witnesslineDb?: Knex };

/** The application's own pool, as the application's database role. */
export function getDb(): Knex {
  holder.witnesslineDb ??= connect(env().DATABASE_URL);
  return holder.witnesslineDb;
}

/** Anything a query can run on: the pool, or a transaction. */
export type Db = Knex | Knex.Transaction;
