import { randomUUID } from "node:crypto";
import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type RevisionState, revisionArrows, revisionStates } from "#shared/lifecycle/revision-states.ts";
import { createTestDatabase, type TestDatabase } from "../support/database.ts";

let database: TestDatabase;
let owner: pg.Client;
let app: pg.Client;
beforeAll(async () => {
  database = await createTestDatabase();
  owner = new pg.Client({ connectionString: database.ownerUrl });
  app = new pg.Client({ connectionString: database.appUrl });
  await Promise.all([owner.connect(), app.connect()]);
});
afterAll(async () => {
  await Promise.all([owner.end(), app.end()]);
  await database.drop();
});

const hash = "0123456789abcdef".repeat(4);
type Work = Record<
  "shop" | "person" | "client" | "contact" | "job" | "file" | "revision" | "decision" | "event",
  string
>;

/** A shop with one job, one issued and decided revision and one event, written straight into the tables. */
async function buildWork(): Promise<Work> {
  const [shop, person, client, contact, job, file, revision, decision] = Array.from({ length: 8 }, () => randomUUID());
  const at = new Date();
  const insert = (table: string, row: Record<string, unknown>) =>
    app.query(
      `insert into ${table} (${Object.keys(row).join(", ")}) values (${Object.keys(row)
        .map((_, index) => `$${index + 1}`)
        .join(", ")})`,
      Object.values(row),
    );
  await insert("shops", { id: shop, slug: `s-${shop}`, name: "Shop", job_prefix: "S", created_at: at });
  await insert("people", { id: person, email: `${person}@x.example`, name: "P", created_at: at });
  await insert("clients", { id: client, shop_id: shop, name: "Client", created_at: at });
  await insert("contacts", {
    id: contact,
    shop_id: shop,
    client_id: client,
    person_id: person,
    name: "C",
    created_at: at,
  });
  await insert("jobs", {
    id: job,
    shop_id: shop,
    client_id: client,
    number: "S-0001",
    title: "Sign",
    brief: "{}",
    state: "mockup",
    whose_move: "ours",
    created_by: person,
    created_at: at,
  });
  await insert("stored_files", {
    id: file,
    shop_id: shop,
    sha256: hash,
    byte_size: 4,
    media_type: "application/pdf",
    storage_key: file,
    created_at: at,
  });
  await insert("revisions", {
    id: revision,
    shop_id: shop,
    job_id: job,
    letter: "A",
    sequence: 1,
    state: "preparing",
    snapshot: "{}",
    snapshot_sha256: hash,
    issued_by: person,
    requested_at: at,
  });
  await app.query("update revisions set state = 'issued', pdf_file_id = $1, issued_at = now() where id = $2", [
    file,
    revision,
  ]);
  await insert("decisions", {
    id: decision,
    shop_id: shop,
    job_id: job,
    revision_id: revision,
    kind: "revision asked",
    contact_id: contact,
    person_id: person,
    by_name: "C",
    pdf_sha256: hash,
    snapshot_sha256: hash,
    address: "127.0.0.1",
    agent: "",
    decided_at: at,
  });
  await insert("certificates", {
    id: randomUUID(),
    shop_id: shop,
    decision_id: decision,
    file_id: file,
    created_at: at,
  });
  const { rows } = await app.query(
    "insert into events (shop_id, at, kind, side, who) values ($1, now(), 'shop opened', 'shop', 'P') returning id",
    [shop],
  );
  const ids = { shop, person, client, contact, job, file, revision, decision, event: String(rows[0].id) };
  return ids as Work;
}

/** The SQLSTATE that a statement is refused with. */
async function refusal(role: pg.Client, statement: string, values: unknown[] = []): Promise<string> {
  try {
    await role.query(statement, values);
  } catch (error) {
    if (error instanceof pg.DatabaseError) return error.code ?? "";
    throw error;
  }
  return "not refused";
}

const restricted = "23001";
const notPermitted = "42501";
const foreignKey = "23503";

describe("what is kept", () => {
  it.each(["events", "decisions", "certificates"])(
    "%s are never changed or deleted, not even by the owner",
    async (table) => {
      await buildWork();
      expect(await refusal(owner, `update ${table} set shop_id = shop_id`)).toBe(restricted);
      expect(await refusal(owner, `delete from ${table}`)).toBe(restricted);
      expect(await refusal(app, `update ${table} set shop_id = shop_id`)).toBe(notPermitted);
      expect(await refusal(app, `delete from ${table}`)).toBe(notPermitted);
    },
  );

  it("stored files are never changed, revisions never deleted", async () => {
    await buildWork();
    expect(await refusal(owner, "update stored_files set sha256 = sha256")).toBe(restricted);
    expect(await refusal(app, "update stored_files set sha256 = sha256")).toBe(notPermitted);
    expect(await refusal(owner, "delete from revisions")).toBe(restricted);
    expect(await refusal(app, "delete from revisions")).toBe(notPermitted);
  });

  it.each(["events", "decisions", "certificates", "stored_files", "revisions", "set_asides"])(
    "%s are never emptied, not even along with others",
    async (table) => {
      expect(await refusal(owner, `truncate ${table} cascade`)).toBe(restricted);
      expect(await refusal(app, `truncate ${table} cascade`)).toBe(notPermitted);
      expect(await refusal(owner, "truncate shops cascade")).toBe(restricted);
    },
  );
});

describe("a revision", () => {
  it("keeps what it froze, its letter and its PDF", async () => {
    const { revision, person } = await buildWork();
    for (const change of [
      "snapshot = '{\"other\":1}'",
      "snapshot_sha256 = repeat('f', 64)",
      "message = 'other'",
      "letter = 'B'",
      "sequence = 2",
      "issued_at = now() + interval '1 day'",
      `issued_by = '${randomUUID()}'`,
      "pdf_file_id = null",
    ]) {
      expect({
        change,
        code: await refusal(owner, `update revisions set ${change} where id = $1`, [revision]),
      }).toEqual({
        change,
        code: restricted,
      });
    }
    const { rows } = await owner.query("select snapshot, letter, issued_by from revisions where id = $1", [revision]);
    expect(rows).toEqual([{ snapshot: "{}", letter: "A", issued_by: person }]);
  });

  it("begins as a draft or in preparation", async () => {
    const { shop, job, person, file } = await buildWork();
    const statement = `insert into revisions
      (id, shop_id, job_id, letter, sequence, state, snapshot, snapshot_sha256, pdf_file_id, issued_by, requested_at, issued_at)
      values ($1, $2, $3, 'B', 2, 'issued', '{}', $4, $5, $6, now(), now())`;
    expect(await refusal(owner, statement, [randomUUID(), shop, job, hash, file, person])).toBe(restricted);
  });

  it("moves along the arrows of shared/lifecycle/revision-states.ts and along no other", async () => {
    const possible: [RevisionState, RevisionState][] = [];
    for (const from of revisionStates) {
      for (const to of revisionStates) {
        if (from !== to && (await canMove(from, to))) possible.push([from, to]);
      }
    }
    const arrows = revisionStates.flatMap((from) => revisionArrows[from].map((to) => [from, to]));
    expect(possible.sort()).toEqual(arrows.sort());
    expect(arrows).toHaveLength(9);
  });

  /** Whether the guard itself lets a move pass, asked of a bare table with the same trigger. */
  async function canMove(from: RevisionState, to: RevisionState): Promise<boolean> {
    await owner.query("begin");
    try {
      await owner.query("create temporary table bare (like revisions including defaults) on commit drop");
      await owner.query(
        "insert into bare (id, shop_id, job_id, letter, sequence, state, message, issued_by, requested_at) values ($1, $1, $1, 'A', 1, $2, '', $1, now())",
        [randomUUID(), from],
      );
      await owner.query("create trigger guarded before update on bare for each row execute function guard_revision()");
      return (await refusal(owner, "update bare set state = $1", [to])) === "not refused";
    } finally {
      await owner.query("rollback");
    }
  }
});

const checkFails = "23514";
const insertSetAside = `insert into set_asides (id, shop_id, job_id, rule, severity, binding_sha256, finding, reason,
  set_aside_by, set_aside_name, set_aside_role, set_aside_at)
  values ($1, $2, $3, $4, $5, $6, '{"rule":1}', $7, $8, 'P', $9, now())`;
const setAsideRow = (
  { shop, job, person }: Pick<Work, "shop" | "job" | "person">,
  overrides: { id?: string; rule?: number; severity?: string; binding?: string; reason?: string; role?: string } = {},
): unknown[] => {
  const row = { id: randomUUID(), rule: 1, severity: "stop", binding: hash, reason: "As meant", role: "maker" };
  const { id, rule, severity, binding, reason, role } = { ...row, ...overrides };
  return [id, shop, job, rule, severity, binding, reason, person, role];
};

describe("what was set aside", () => {
  it("is never deleted, and changed only once: by being taken back", async () => {
    const work = await buildWork();
    const id = randomUUID();
    expect(await refusal(app, insertSetAside, setAsideRow(work, { id }))).toBe("not refused");
    for (const change of [
      "reason = 'other'",
      "finding = '{}'",
      "rule = 2",
      "severity = 'caution'",
      "binding_sha256 = repeat('f', 64)",
      "set_aside_name = 'Q'",
      "set_aside_role = 'owner'",
      "set_aside_at = now() + interval '1 day'",
    ]) {
      const code = await refusal(owner, `update set_asides set ${change} where id = $1`, [id]);
      expect({ change, code }).toEqual({ change, code: restricted });
    }
    expect(await refusal(owner, "delete from set_asides")).toBe(restricted);
    const takeBack =
      "update set_asides set taken_back_by = $2, taken_back_name = 'P', taken_back_at = now() where id = $1";
    expect(await refusal(app, "update set_asides set taken_back_at = now() where id = $1", [id])).toBe(checkFails);
    expect(await refusal(app, takeBack, [id, work.person])).toBe("not refused");
    expect(await refusal(app, takeBack, [id, work.person])).toBe(restricted);
    const undo =
      "update set_asides set taken_back_by = null, taken_back_name = null, taken_back_at = null where id = $1";
    expect(await refusal(owner, undo, [id])).toBe(restricted);
  });

  it("stands once for what it is bound to, until it is taken back", async () => {
    const work = await buildWork();
    const id = randomUUID();
    await app.query(insertSetAside, setAsideRow(work, { id }));
    expect(await refusal(app, insertSetAside, setAsideRow(work))).toBe("23505");
    expect(await refusal(app, insertSetAside, setAsideRow(work, { binding: "f".repeat(64) }))).toBe("not refused");
    expect(await refusal(app, insertSetAside, setAsideRow(await buildWork()))).toBe("not refused");
    await app.query(
      "update set_asides set taken_back_by = $2, taken_back_name = 'P', taken_back_at = now() where id = $1",
      [id, work.person],
    );
    expect(await refusal(app, insertSetAside, setAsideRow(work))).toBe("not refused");
  });

  it.each([
    { what: "no reason", row: { reason: "" } },
    { what: "a blank one", row: { reason: " \t\n    " } },
    { what: "two letters of one", row: { reason: "ok" } },
    { what: "more than 500", row: { reason: "x".repeat(501) } },
    { what: "a safety stop by a maker", row: { rule: 36 } },
    { what: "a rep", row: { role: "rep" } },
    { what: "an unknown severity", row: { severity: "hint" } },
  ])("is refused with $what", async ({ row }) => {
    expect(await refusal(app, insertSetAside, setAsideRow(await buildWork(), row))).toBe(checkFails);
  });

  it.each([10, 12, 36, 38])("a stop of rule %i was set aside by an owner, a caution of it by either", async (rule) => {
    const work = await buildWork();
    expect(await refusal(app, insertSetAside, setAsideRow(work, { rule }))).toBe(checkFails);
    expect(await refusal(app, insertSetAside, setAsideRow(work, { rule, role: "owner" }))).toBe("not refused");
    const caution = { rule, severity: "caution", binding: "f".repeat(64) };
    expect(await refusal(app, insertSetAside, setAsideRow(work, caution))).toBe("not refused");
  });
});

describe("notes", () => {
  it.each([
    { age: "1 minute", code: "not refused" },
    { age: "11 minutes", code: restricted },
  ])("of $age: what they say is refused to change by $code", async ({ age, code }) => {
    const { shop, job, revision, person } = await buildWork();
    const [note, reply] = [randomUUID(), randomUUID()];
    await app.query(
      `insert into notes (id, shop_id, job_id, revision_id, number, kind, text, anchor, side, author_id, author_name, created_at) values ($1, $2, $3, $4, 1, 'question', 'x', '{}', 'shop', $5, 'P', now() - interval '${age}')`,
      [note, shop, job, revision, person],
    );
    await app.query(
      `insert into replies (id, shop_id, note_id, text, side, author_id, author_name, created_at) values ($1, $2, $3, 'x', 'shop', $4, 'P', now() - interval '${age}')`,
      [reply, shop, note, person],
    );
    expect(await refusal(app, "update notes set text = 'y' where id = $1", [note])).toBe(code);
    expect(await refusal(app, "update notes set kind = 'must change' where id = $1", [note])).toBe(code);
    expect(await refusal(app, "update replies set text = 'y' where id = $1", [reply])).toBe(code);
    expect(await refusal(app, "update notes set state = 'settled' where id = $1", [note])).toBe("not refused");
  });
});

describe("shops", () => {
  it("no row can point into another shop", async () => {
    const mine = await buildWork();
    const theirs = await buildWork();
    const cases: [string, unknown[]][] = [
      ["update jobs set client_id = $1 where id = $2", [theirs.client, mine.job]],
      ["update contacts set client_id = $1 where id = $2", [theirs.client, mine.contact]],
      [
        "insert into job_approvers (shop_id, job_id, contact_id) values ($1, $2, $3)",
        [mine.shop, mine.job, theirs.contact],
      ],
      [
        "insert into job_approvers (shop_id, job_id, contact_id) values ($1, $2, $3)",
        [mine.shop, theirs.job, mine.contact],
      ],
      [
        "insert into mockups (id, shop_id, job_id, version, document, saved_by, saved_at) values ($1, $2, $3, 1, '{}', $4, now())",
        [randomUUID(), mine.shop, theirs.job, mine.person],
      ],
      [
        "insert into artworks (id, shop_id, job_id, file_id, name, state, added_by, added_at) values ($1, $2, $3, $4, 'x', 'importing', $5, now())",
        [randomUUID(), mine.shop, mine.job, theirs.file, mine.person],
      ],
      [
        "insert into notes (id, shop_id, job_id, revision_id, number, kind, text, anchor, side, author_id, author_name, created_at) values ($1, $2, $3, $4, 1, 'question', 'x', '{}', 'shop', $5, 'P', now())",
        [randomUUID(), mine.shop, mine.job, theirs.revision, mine.person],
      ],
      [
        "insert into events (shop_id, job_id, at, kind, side, who) values ($1, $2, now(), 'x', 'shop', 'P')",
        [mine.shop, theirs.job],
      ],
      [insertSetAside, setAsideRow({ ...mine, job: theirs.job })],
      [
        "insert into outgoing_mails (id, shop_id, job_id, kind, address, created_at) values ($1, $2, $3, 'x', 'a@b.example', now())",
        [randomUUID(), mine.shop, theirs.job],
      ],
    ];
    for (const [statement, values] of cases) {
      expect({ statement, code: await refusal(app, statement, values) }).toEqual({ statement, code: foreignKey });
    }
  });

  it("a job that anything hangs on is not deleted with its history", async () => {
    const { job } = await buildWork();
    expect(await refusal(owner, "delete from jobs where id = $1", [job])).toBe(foreignKey);
    expect(await refusal(app, "delete from jobs where id = $1", [job])).toBe(notPermitted);
  });
});

describe("the application's role", () => {
  it.each([
    "alter table jobs add column extra text",
    "alter table events disable trigger all",
    "drop trigger events_kept on events",
    "drop table notes",
    "truncate notes",
    "create table mine (id integer)",
    "update migrations set name = 'x'",
    "delete from migrations",
    "delete from notes",
    "delete from people",
    "delete from stored_files",
    "delete from outgoing_mails",
    "update notes set author_name = 'x'",
    "update replies set author_name = 'x'",
    "update set_asides set reason = 'other'",
    "update set_asides set finding = '{}'",
    "delete from set_asides",
    "create or replace function refuse_change() returns trigger language plpgsql as $$ begin return new; end $$",
    "set session_replication_role = replica",
    "set role standproud_owner",
  ])("may not: %s", async (statement) => {
    expect(await refusal(app, statement)).toBe(notPermitted);
  });

  it("owns nothing", async () => {
    const { rows } = await app.query(
      "select count(*)::int as owned from pg_class where relowner = current_user::regrole",
    );
    expect(rows).toEqual([{ owned: 0 }]);
  });

  it("adds jobs to the queue and takes them", async () => {
    await app.query("select graphile_worker.add_job('send-mail', '{\"mailId\":\"x\"}')");
    const { rows } = await app.query("select count(*)::int as waiting from graphile_worker.jobs");
    expect(rows).toEqual([{ waiting: 1 }]);
    expect(await refusal(app, "drop table graphile_worker._private_jobs")).toBe(notPermitted);
  });
});
