import type { Knex } from "knex";
import { afterAll, afterEach, beforeAll, beforeEach } from "vitest";
import type { Role } from "#app/domain/shop/permissions.ts";
import type { Storage } from "#app/services/storage.server.ts";
import { type FreshDatabase, freshDatabase } from "#tests/setup/test-db.ts";
import { aFurnishedShop, type FurnishedShop } from "./furnished-shop.ts";
import { signedIn } from "./hold-server.ts";
import { type ShopApp, shopApp } from "./shop-app.ts";
import { startTestStorage, type TestStorage } from "./storage.ts";

export interface TwoShops {
  app: ShopApp;
  shop: FurnishedShop;
  /** Another shop, with the same records. */
  other: FurnishedShop;
  /** Cookies of the first shop's people. */
  cookies: Record<Role, string>;
  /** The transaction of the running test. */
  db: () => Knex;
  /** Another connection, outside the running test. */
  pool: () => Knex;
  storage: () => Storage;
  /** What is written in every table of the shops, in short: the same text means that nothing has changed. */
  written(): Promise<string>;
}

/**
 * For tests of what a request may: the whole app on two furnished shops. Each test runs in a transaction that is rolled back, and no file is ever
 * deleted, so that each finds the shops as they were.
 */
export function useTwoShops(): TwoShops {
  let fresh: FreshDatabase;
  let files: TestStorage;
  let transaction: Knex.Transaction;
  const scene: Partial<TwoShops> = {
    db: () => transaction,
    pool: () => fresh.db,
    storage: () => ({ ...files.storage, delete: async () => {} }),
  };

  beforeAll(async () => {
    [fresh, files] = await Promise.all([freshDatabase(), startTestStorage()]);
    scene.shop = await aFurnishedShop(fresh.db, files.storage);
    scene.other = await aFurnishedShop(fresh.db, files.storage);
    const { owner, maker, helper } = scene.shop.people;
    scene.cookies = {
      owner: await signedIn(fresh.db, owner),
      maker: await signedIn(fresh.db, maker),
      helper: await signedIn(fresh.db, helper),
    };
    scene.app = await shopApp({ db: () => transaction, storage: (scene as TwoShops).storage() });
    const [tables] = await fresh.db.raw("SHOW TABLES");
    const names = tables
      .map((row: Record<string, string>) => Object.values(row)[0])
      .filter((name: string) => name !== "sessions");
    scene.written = async () => {
      const [sums] = await transaction.raw(`CHECKSUM TABLE ${names.join(", ")}`);
      return JSON.stringify(sums);
    };
  });
  beforeEach(async () => {
    transaction = await fresh.db.transaction();
  });
  afterEach(() => transaction.rollback());
  afterAll(() => Promise.all([fresh.drop(), files.stop()]));
  return scene as TwoShops;
}
