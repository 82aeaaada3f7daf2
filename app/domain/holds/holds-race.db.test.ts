import fc from "fast-check";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Actor } from "#app/domain/shop/actor.ts";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { type HoldServer, signedIn, startHoldServer } from "#tests/factories/hold-server.ts";
import { anActor } from "#tests/factories/shop.ts";
import { type FreshDatabase, freshDatabase } from "#tests/setup/test-db.ts";
import type { HoldRefusal } from "./hold.ts";

describe("people at two web processes", () => {
  let fresh: FreshDatabase;
  let servers: HoldServer[];
  let ana: Actor;
  let ben: Actor;
  let cookies: string[];
  const until = new Date(Date.now() + 14 * 86_400_000).toISOString().slice(0, 10);

  beforeAll(async () => {
    fresh = await freshDatabase();
    servers = await Promise.all([startHoldServer(fresh.url), startHoldServer(fresh.url)]);
    ana = await anActor(fresh.db, "maker", { name: "Ana" });
    ben = await anActor(fresh.db, "owner", { shopId: ana.shopId, name: "Ben" });
    cookies = [await signedIn(fresh.db, ana), await signedIn(fresh.db, ben)];
  });
  afterAll(async () => {
    await Promise.all(servers.map((server) => server.stop()));
    await fresh.drop();
  });

  test("50 ask for the same length at once: one gets it, 49 are told who has it, until when, and what else would do", async () => {
    const board = await aBoard(fresh.db, ana);
    const another = await aBoard(fresh.db, ana);
    const project = await aProject(fresh.db, ana, { name: "Hall bench" });
    const form = { projectId: project.id, part: "near", lengthMm: "48", until, note: "" };
    const answers = await Promise.all(
      Array.from({ length: 50 }, (_, i) =>
        servers[i % 2]!.press(`/boards/${board.id}/reserve`, cookies[(i >> 1) % 2]!, form),
      ),
    );
    expect(answers.filter(({ status }) => status === 302)).toHaveLength(1);
    const refused = answers.filter(({ status }) => status === 409).map(({ data }) => data as { refusal: HoldRefusal });
    expect(refused).toHaveLength(49);
    const [held] = await fresh.db("holds").where({ board_id: board.id });
    const winner = held.placed_by === ana.personId ? "Ana" : "Ben";
    for (const { refusal } of refused)
      expect(refusal).toMatchObject({
        why: "held",
        by: [
          { placedBy: winner, projectName: "Hall bench", fromMm: 0, toMm: 1219.2, expiresAt: `${until}T23:59:59.999Z` },
        ],
        free: [{ fromMm: 1219.2, toMm: board.lengthMm }],
        others: [{ id: another.id }],
      });
    expect(await fresh.db("holds").where({ board_id: board.id })).toHaveLength(1);
    expect(await fresh.db("hold_spans").where({ board_id: board.id })).toHaveLength(1);
    expect(await fresh.db("board_events").where({ board_id: board.id, kind: "reserved" })).toHaveLength(1);
  });

  /** What must hold of the database whatever anybody did, as counts of the rows that break it. */
  async function broken() {
    const [[row]] = await fresh.db.raw(`SELECT
      (SELECT COUNT(*) FROM holds a JOIN holds b ON b.board_id = a.board_id AND a.id < b.id
        WHERE a.state IN ('held', 'out') AND b.state IN ('held', 'out') AND a.from_mm < b.to_mm AND b.from_mm < a.to_mm) AS overlaps,
      (SELECT COUNT(*) FROM holds h LEFT JOIN hold_spans s ON s.hold_id = h.id
        WHERE (h.state IN ('held', 'out')) <> (s.hold_id IS NOT NULL)) AS claims,
      (SELECT COUNT(*) FROM holds h JOIN boards b ON b.id = h.board_id
        WHERE (b.state = 'racked' AND h.state = 'out') OR (b.state = 'out' AND h.state = 'held')) AS states,
      (SELECT COUNT(*) FROM holds h JOIN boards b ON b.id = h.board_id
        WHERE h.state IN ('held', 'out') AND h.to_mm > b.length_mm) AS beyond`);
    return row;
  }

  const steps = fc.record({
    kind: fc.constantFrom("reserve", "reserve", "reserve", "let go", "extend", "take down", "put back"),
    part: fc.constantFrom("near", "far", "whole"),
    lengthIn: fc.integer({ min: 10, max: 80 }),
    board: fc.nat(1),
    who: fc.nat(1),
    at: fc.nat(1),
    hold: fc.nat(20),
  });

  test("reserve, let go, extend, take down and put back as they come: no two live holds ever overlap, and each change has its line", async () => {
    const boards = [await aBoard(fresh.db, ana), await aBoard(fresh.db, ana)];
    const project = await aProject(fresh.db, ana);
    const boardIds = boards.map(({ id }) => id);
    const count = async () =>
      Number((await fresh.db("board_events").whereIn("board_id", boardIds).count({ n: "*" }).first())?.n);
    const statuses: number[] = [];
    const rounds = 8;
    const perRound = 20;
    const plan = fc.sample(steps, { seed: 20_270_301, numRuns: rounds * perRound });
    for (let round = 0; round < rounds; round++) {
      const held: { id: string }[] = await fresh.db("holds").whereIn("board_id", boardIds).select("id").orderBy("id");
      const press = ({ kind, part, lengthIn, board, who, at, hold }: (typeof plan)[number]) => {
        const server = servers[at]!;
        const cookie = cookies[who]!;
        const path = `/boards/${boardIds[board]}`;
        if (kind === "reserve" || held.length === 0) {
          const form = { projectId: project.id, part, lengthMm: String(lengthIn), until, note: "" };
          return server.press(`${path}/reserve`, cookie, form);
        }
        if (kind === "let go" || kind === "extend")
          return server.press(`/holds/${held[hold % held.length]!.id}`, cookie, { intent: kind });
        return server.press(`${path}/state`, cookie, { intent: kind });
      };
      const answers = await Promise.all(plan.slice(round * perRound, (round + 1) * perRound).map(press));
      statuses.push(...answers.map(({ status }) => status));
      expect(await broken()).toEqual({ overlaps: 0, claims: 0, states: 0, beyond: 0 });
    }
    expect([...new Set(statuses)].sort()).toEqual([302, 403, 409]);
    expect(await count()).toBe(statuses.filter((status) => status === 302).length);
  });
});
