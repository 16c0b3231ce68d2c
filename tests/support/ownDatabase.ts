// Gives a test file a database of its own before the file, and with it the code under test, is loaded.
import { afterAll } from "vitest";
import { createDatabase } from "./database.ts";

const database = await createDatabase();

process.env.CLATTERBENCH_MODE = "demo";
process.env.DATABASE_URL = database.url;
process.env.BETTER_AUTH_SECRET = "only-for-tests-only-for-tests-only";
process.env.PUBLIC_URL = "http://clatterbench.test";
process.env.LOG_LEVEL = "silent";

afterAll(() => database.drop());
