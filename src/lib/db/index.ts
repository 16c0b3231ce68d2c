export { openDatabase, type Database, type Queryable, type Transaction } from "./client.ts";
export { newId } from "./id.ts";
export * from "./schema/index.ts";
