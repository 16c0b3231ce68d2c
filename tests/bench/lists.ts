/** `npm run bench -- lists`: what lists cost in a team with 1,000 voices, 20,000 revisions and 100,000 remarks. */
import { analyseStages, libraryVersion } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { openDatabase, type Database } from "#lib/db/index.ts";
import { listActivity } from "#lib/server/activity/list.ts";
import { listComments } from "#lib/server/comments/list.ts";
import type { Context } from "#lib/server/context.ts";
import { listRevisions } from "#lib/server/revisions/list.ts";
import { startingDocument } from "#lib/server/workingCopies/startingDocument.ts";
import { listVoices } from "#lib/server/voices/list.ts";
import { activityQuery } from "#lib/wire/activity.ts";
import { commentListQuery } from "#lib/wire/comment.ts";
import { revisionListQuery } from "#lib/wire/revision.ts";
import { voiceListQuery } from "#lib/wire/voice.ts";
import postgres from "postgres";
import { releaseCluster, startCluster } from "../../docker-less-db/cluster.mjs";
import { migrateDatabase } from "../../src/run/migrate.ts";

const aim = 100;
const counts = { voices: 1000, revisionsEach: 20, commentsEach: 100 };

/** Rows are made inside the database: sending a hundred thousand of them would take longer than what is measured. */
async function seed(sql: postgres.Sql): Promise<void> {
  const document = startingDocument("two-path-noise");
  const inputs = JSON.stringify(document);
  const analysis = JSON.stringify(analyseStages(document, stageKinds));
  const { voices, revisionsEach, commentsEach } = counts;
  await sql`insert into teams (id, name, slug) values ('tea_bench', 'Bench', 'bench'), ('tea_other', 'Other', 'other')`;
  await sql`insert into users (id, name, email) values ('usr_bench', 'Bench', 'bench@example.test')`;
  await sql`insert into members (id, team_id, user_id, role) values ('mem_bench', 'tea_bench', 'usr_bench', 'owner')`;
  await sql`insert into voices (id, team_id, name, created_by, created_at, updated_at)
    select 'voi_' || n, 'tea_bench', 'Voice ' || n, 'usr_bench', now() - n * interval '1 hour', now() - n * interval '1 minute'
    from generate_series(1, ${voices}::int) n`;
  await sql`insert into working_copies (voice_id, document, updated_by) select id, ${inputs}::text::jsonb, 'usr_bench' from voices`;
  await sql`insert into revisions (id, voice_id, number, reason, inputs, analysis, accepted_warnings, library_version, author_id, author_name, created_at)
    select 'rev_' || v.n || 'x' || r, 'voi_' || v.n, r, 'reason ' || r, ${inputs}::text::jsonb, ${analysis}::text::jsonb, '[]', ${libraryVersion},
      'usr_bench', 'Bench', now() - (${revisionsEach}::int - r) * interval '1 minute'
    from generate_series(1, ${voices}::int) v(n), generate_series(1, ${revisionsEach}::int) r`;
  await sql`insert into comments (id, voice_id, revision_id, text, author_id, author_name, created_at)
    select 'com_' || v.n || 'x' || c, 'voi_' || v.n, 'rev_' || v.n || 'x' || (1 + c % ${revisionsEach}::int), 'Remark ' || c, 'usr_bench', 'Bench',
      now() - c * interval '1 second'
    from generate_series(1, ${voices}::int) v(n), generate_series(1, ${commentsEach}::int) c`;
  await sql`insert into audit_events (id, team_id, actor_id, action, subject_id, at)
    select 'evt_' || n, case when n % 4 = 0 then 'tea_other' else 'tea_bench' end, 'usr_bench', 'comment.write', 'voi_' || (1 + n % ${voices}::int),
      now() - n * interval '1 second'
    from generate_series(1, 150000) n`;
  await sql`analyze`;
}

const lists = (ctx: Context): Record<string, (cursor?: string) => Promise<{ nextCursor: string | null }>> => {
  const more = (cursor?: string) => (cursor === undefined ? {} : { cursor });
  const voice = { id: "voi_500" };
  return {
    "voices, newest": (cursor) => listVoices({ ctx, input: voiceListQuery.parse({ limit: 200, ...more(cursor) }) }),
    "voices, by name": (cursor) =>
      listVoices({ ctx, input: voiceListQuery.parse({ limit: 200, sort: "name", ...more(cursor) }) }),
    "voices whose name has 99": () => listVoices({ ctx, input: voiceListQuery.parse({ limit: 200, name: "99" }) }),
    "revisions of a voice": (cursor) =>
      listRevisions({ ctx, input: { ...voice, ...revisionListQuery.parse({ limit: 10, ...more(cursor) }) } }),
    "remarks on a voice": (cursor) =>
      listComments({ ctx, input: { ...voice, ...commentListQuery.parse({ limit: 50, ...more(cursor) }) } }),
    "remarks on a revision": () =>
      listComments({ ctx, input: { ...voice, ...commentListQuery.parse({ limit: 200, revision: 7 }) } }),
    "activity of the team": (cursor) =>
      listActivity({ ctx, input: activityQuery.parse({ limit: 200, ...more(cursor) }) }),
    "activity of a voice": (cursor) =>
      listActivity({ ctx, input: activityQuery.parse({ limit: 50, voice: voice.id, ...more(cursor) }) }),
  };
};

const median = (values: number[]) => values.sort((a, b) => a - b)[Math.floor(values.length / 2)]!;

/** Time of a page in the middle of the list: the second, which a cursor leads to. */
async function measure(list: (cursor?: string) => Promise<{ nextCursor: string | null }>): Promise<number> {
  const { nextCursor } = await list();
  const times: number[] = [];
  for (let i = 0; i < 15; i++) {
    const began = performance.now();
    await list(nextCursor ?? undefined);
    times.push(performance.now() - began);
  }
  return median(times);
}

/** The names of tables that a query reads from end to end, as its plan says. */
async function scannedWhole(sql: postgres.Sql, query: string): Promise<string[]> {
  const [row] = await sql.unsafe(`explain (format json) ${query}`);
  const found: string[] = [];
  const walk = (node: Record<string, unknown>) => {
    if (node["Node Type"] === "Seq Scan") found.push(String(node["Relation Name"]));
    for (const child of (node["Plans"] as Record<string, unknown>[] | undefined) ?? []) walk(child);
  };
  walk((row?.["QUERY PLAN"] as { Plan: Record<string, unknown> }[])[0]!.Plan);
  return found;
}

const plans: Record<string, string> = {
  "voices, newest": `select id from voices where team_id = 'tea_bench' order by updated_at desc, id desc limit 51`,
  "revisions of a voice": `select id from revisions where voice_id = 'voi_500' order by number desc limit 51`,
  "remarks on a voice": `select id from comments where voice_id = 'voi_500' order by created_at, id limit 51`,
  "remarks on a revision": `select id from comments where revision_id = 'rev_500x7' order by created_at, id limit 51`,
  "activity of the team": `select id from audit_events where team_id = 'tea_bench' order by at desc, id desc limit 51`,
  "activity of a voice": `select id from audit_events where team_id = 'tea_bench' and subject_id = 'voi_500' order by at desc, id desc limit 51`,
};

export async function benchLists(): Promise<boolean> {
  const { url } = await startCluster("test");
  const admin = postgres(url, { max: 1, onnotice: () => undefined });
  const name = `bench_lists_${process.pid}`;
  await admin`CREATE DATABASE ${admin(name)}`;
  const address = new URL(url);
  address.pathname = `/${name}`;
  const sql = postgres(address.href, { max: 1, onnotice: () => undefined });
  let db: Database | undefined;
  try {
    await migrateDatabase(address.href);
    await seed(sql);
    db = openDatabase(address.href, { connections: 2 });
    const team = { id: "tea_bench", name: "Bench", slug: "bench" };
    const person = { userId: "usr_bench", name: "Bench", email: "bench@example.test" };
    const ctx: Context = { db, actor: { ...person, team, role: "owner" }, now: () => new Date(), site: "" };
    let kept = true;
    for (const [what, list] of Object.entries(lists(ctx))) {
      const time = await measure(list);
      kept &&= time < aim;
      console.log(`${`list: ${what}`.padEnd(44)} ${time.toFixed(1)} ms (aim: under ${aim})`);
    }
    for (const [what, query] of Object.entries(plans)) {
      const whole = await scannedWhole(sql, query);
      kept &&= whole.length === 0;
      console.log(
        `${`plan: ${what}`.padEnd(44)} ${whole.length === 0 ? "by index" : `reads all of ${whole.join(", ")}`}`,
      );
    }
    return kept;
  } finally {
    await db?.close();
    await sql.end();
    await admin`DROP DATABASE ${admin(name)} WITH (FORCE)`;
    await admin.end();
    await releaseCluster("test");
  }
}
